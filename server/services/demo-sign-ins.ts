/** The people of the demo, with the password that they share; shown on the sign-in page of a demo alone. */
const PASSWORD = 'brass poise at rest';

export const DEMO_PASSWORD = PASSWORD;

export const DEMO_SIGN_INS = [
  { email: 'noor@petrel.example', password: PASSWORD, role: 'engineer, owns the numbers' },
  { email: 'tomas@petrel.example', password: PASSWORD, role: 'engineer, controls' },
  { email: 'ingrid@petrel.example', password: PASSWORD, role: 'approver, checks and releases' },
  { email: 'lucia@petrel.example', password: PASSWORD, role: 'viewer, leads the programme' },
  { email: 'bram@petrel.example', password: PASSWORD, role: 'administrator' },
];
