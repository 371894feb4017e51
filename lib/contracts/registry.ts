import { planBay, seeBayOrder } from './bay-order'
import { board } from './board'
import type { Contract } from './contract'
import { decideCrew, listCrew } from './crew'
import { choosePassword, inviteCrew } from './crew-invite'
import { openEntryLink } from './entry-link'
import { eventDeclarations } from './event-declarations'
import { createEvent, saveTimetable } from './events'
import { enrolDevice, listDevices, retireDevice } from './devices'
import { editEntry } from './entry-edit'
import { entryImport } from './entry-import'
import { holds } from './holds'
import { join, joinState, makeJoinCode, seeJoinCode } from './join'
import { live } from './live'
import { eventMail, mailAgain, writeMailing } from './mail'
import { me } from './me'
import { getPhoto, putPhoto } from './photos'
import { saveDraft, signDeclaration } from './my-declaration'
import { myEntry } from './my-entry'
import { addCar, addKit, keepCar, keepKit } from './my-garage'
import { reportCsv, reportJson } from './report'
import { signIn } from './sign-in'
import { signOut } from './sign-out'
import { syncPull } from './sync-pull'
import { syncPush } from './sync-push'
import { voidPass } from './void-pass'

/** Every contract there is. A route whose contract is not in this list fails the architecture test. */
export const CONTRACTS: readonly Contract[] = [
  signIn,
  signOut,
  me,
  makeJoinCode,
  seeJoinCode,
  join,
  joinState,
  listCrew,
  decideCrew,
  inviteCrew,
  choosePassword,
  enrolDevice,
  listDevices,
  retireDevice,
  syncPush,
  syncPull,
  live,
  createEvent,
  reportCsv,
  reportJson,
  saveTimetable,
  board,
  seeBayOrder,
  planBay,
  entryImport,
  editEntry,
  eventMail,
  writeMailing,
  mailAgain,
  putPhoto,
  getPhoto,
  openEntryLink,
  myEntry,
  saveDraft,
  signDeclaration,
  addCar,
  keepCar,
  addKit,
  keepKit,
  eventDeclarations,
  holds,
  voidPass,
]
