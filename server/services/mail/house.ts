/** Under which farm id letters of no farm stand: RFC 9562's nil id. */
export const HOUSE = '00000000-0000-0000-0000-000000000000'
