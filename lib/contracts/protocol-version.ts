/**
 * Version of the shapes that cross the network. One line of history per version:
 * 1 (2026-12): push, pull, day, enrolment.
 */
export const PROTOCOL_VERSION = 1
