const CYBERPHONE = 'cyberphone/json-canonicalization testdata (commit 19d51d7)'

/** Values with their canonical text and its SHA-256. The input text of structures.json is its output in another order. */
export const CANONICAL_CASES = [
  {
    id: 'arrays.json',
    source: CYBERPHONE,
    json: '[56,{"d":true,"10":null,"1":[]}]',
    text: '[56,{"1":[],"10":null,"d":true}]',
    bytes: 32,
    sha256: '099601b171cafed97c333f8878d68e7f8c8f795412adb34b2fdcf0e7c7beac42',
  },
  {
    id: 'structures.json',
    source: CYBERPHONE,
    json: '{"1":{"f":{"f":"hi","F":5},"\\n":56.0},"10":{},"":"empty","a":{},"111":[{"e":"yes","E":"no"}],"A":{}}',
    text: '{"":"empty","1":{"\\n":56,"f":{"F":5,"f":"hi"}},"10":{},"111":[{"E":"no","e":"yes"}],"A":{},"a":{}}',
    bytes: 98,
    sha256: '605f65004ec2db7692522a0852c22f1c989e036d547e88963d1a3143cf3195d5',
  },
  {
    id: 'values.json',
    source: `${CYBERPHONE}; RFC 8785 section 3.2.2`,
    json: '{"numbers":[333333333.33333329,1E30,4.50,2e-3,0.000000000000000000000000001],"string":"\\u20ac$\\u000F\\u000aA\'\\u0042\\u0022\\u005c\\\\\\"\\/","literals":[null,true,false]}',
    text: '{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],"string":"€$\\u000f\\nA\'B\\"\\\\\\\\\\"/"}',
    bytes: 118,
    sha256: '2d5e01a318d0f0879ab568c4be289c8b1f64ef8921a53c6277d5e069978baacb',
  },
]

/** IEEE 754 doubles and their text. @source RFC 8785 Appendix B and the README of the same test data. */
export const NUMBER_CASES = [
  { hex: '8000000000000000', text: '0' },
  { hex: '0000000000000001', text: '5e-324' },
  { hex: '4340000000000001', text: '9007199254740994' },
  { hex: '444b1ae4d6e2ef50', text: '1e+21' },
  { hex: '3eb0c6f7a0b5ed8d', text: '0.000001' },
  { hex: '3eb0c6f7a0b5ed8c', text: '9.999999999999997e-7' },
  { hex: '44b52d02c7e14af6', text: '1e+23' },
]
