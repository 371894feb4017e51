/** Everything a column of an entry list may hold. */
export const ENTRY_COLUMNS = [
  'number',
  'name',
  'firstName',
  'surname',
  'email',
  'mobile',
  'make',
  'model',
  'colour',
  'plate',
  'group',
  'passengerSeats',
  'role',
  'secondDriver',
  'team',
  'note',
] as const
export type EntryColumn = (typeof ENTRY_COLUMNS)[number]

/** Columns a list must have; a name may be one column or two. */
export const REQUIRED_COLUMNS: readonly EntryColumn[] = ['number', 'surname', 'model', 'plate', 'group']

/** What a column is called to a person. */
export const COLUMN_NAMES: Readonly<Record<EntryColumn, string>> = {
  number: 'entry number',
  name: 'whole name',
  firstName: 'first name',
  surname: 'surname',
  email: 'e-mail',
  mobile: 'mobile',
  make: 'make',
  model: 'car',
  colour: 'colour',
  plate: 'plate',
  group: 'run group',
  passengerSeats: 'passengers',
  role: 'role',
  secondDriver: 'second driver',
  team: 'team or owner',
  note: 'notes',
}

/** What organisers write above a column, folded by `foldHeader`, in the languages their lists come in. */
export const HEADINGS: Readonly<Record<EntryColumn, string>> = {
  number:
    'n no nr num number entry entryno entrynumber entrynr carno carnumber carnr racenumber raceno startno startnumber startnummer startnr nummer fahrzeugnummer numero numerodecourse numerodevoiture numerovoiture dossard dorsal numerodegara numerogara wedstrijdnummer numerstartowy nrstartowy',
  name: 'name driver drivername fullname fahrer fahrername pilote conducteur nomcomplet piloto conductor nombrecompleto pilota conducente nomecompleto bestuurder rijder naam forare forer namn navn kierowca',
  firstName: 'firstname forename givenname christianname vorname prenom nombre voornaam fornamn fornavn imie',
  surname:
    'surname lastname familyname nachname familienname zuname nom nomdefamille apellido apellidos cognome achternaam efternamn etternavn efternavn nazwisko apelido',
  email:
    'email emailaddress mail emailadresse courriel adressemail adresseemail correo correoelectronico indirizzoemail emailadres epost epostadress adresemail',
  mobile:
    'mobile tel telephone phone mobileno mobilenumber phoneno phonenumber contactnumber cell handy handynummer telefon telefonnummer mobil mobiltelefon portable gsm movil telefono cellulare telefoon mobiel telefone telemovel komorka',
  make: 'make marque marke marca merk marka brand manufacturer hersteller fabrikat',
  model:
    'car vehicle vehiclemakemodel carmakemodel makemodel model makeandmodel auto wagen fahrzeug fahrzeugtyp modell voiture vehicule modele coche vehiculo modelo vettura veicolo modello macchina voertuig bil fordon samochod pojazd carro viatura',
  colour: 'colour color carcolour farbe couleur colore kleur farg farve farge kolor cor',
  plate:
    'reg registration plate regno regnumber registrationnumber registrationno vrm numberplate licenceplate licenseplate kennzeichen kfzkennzeichen nummernschild immatriculation plaque plaquedimmatriculation matricula targa kenteken registreringsnummer regnr nummerplade rejestracja nrrejestracyjny',
  group:
    'group rungroup session level class gruppe fahrgruppe klasse groupe niveau grupo nivel gruppo livello groep grupp niva grupa poziom',
  passengerSeats:
    'passengers pass passenger passengerseats mitfahrer beifahrerplatze passagers pasajeros passeggeri passagiers passagerare passageiros pasazerowie',
  role: 'role capacity rolle funktion fonction rol ruolo functie roll rola participanttype',
  secondDriver:
    'seconddriver codriver driver2 additionaldriver shareddriver zweitfahrer fahrer2 pilote2 secondpilote segundopiloto secondopilota tweederijder andraforare',
  team: 'team fleet owner carowner hirecompany hiredfrom halter eigentumer besitzer ecurie equipe proprietaire equipo propietario squadra proprietario eigenaar agare',
  note: 'notes note comments comment remarks remark bemerkung bemerkungen anmerkung notiz kommentar remarques remarque commentaire commentaires observaciones comentarios notas osservazioni commenti opmerkingen anteckning uwagi info',
}

/** A heading without case, accents, spaces and signs. `#` and `N°` mean the number. */
export function foldHeader(heading: string): string {
  if (heading.trim() === '#') return 'no'
  return heading
    .normalize('NFKD')
    .toLowerCase()
    .replace(/ß/g, 'ss')
    .replace(/ø/g, 'o')
    .replace(/æ/g, 'ae')
    .replace(/ł/g, 'l')
    .replace(/[^a-z0-9]/g, '')
}
