/** `typ` of a record's JWS: what keeps a request token or a certificate, signed by the same kind of key, from being read as a record. */
export const RECORD_TYPE = 'lockwire-record'
