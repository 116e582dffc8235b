// Often found in published lists of leaked passwords; from memory, no source. Kept in small letters, without digits at
// the ends where the letters alone are common: `checkPassword` compares both forms.
const WORDS = `
password passwords passwort motdepasse contrasena parola senha letmein welcome welcomeback administrator admin
adminadmin rootroot changeme changemenow changethis default guest guestguest login loginlogin master mastermaster
secret secretsecret supersecret topsecret qwerty qwertyuiop qwertyqwerty qwertzuiop azertyuiop asdfghjkl asdfasdf
zxcvbnm zxcvbnmasdf iloveyou iloveyouforever ilovey sunshine princess dragon dragondragon monkey monkeymonkey
football baseball basketball superman batman starwars pokemon trustno michael jennifer jordan charlie ashley
abcdef abcdefg abcdefgh abcdefghijkl abcabcabc testtest testtesttest testing temppassword temporary mypassword
thisismypassword yourpassword nopassword passwordpassword passphrase correcthorsebatterystaple hunter
computer internet freedom whatever summer winter spring autumn summertime winterwinter january february march april
june july august september october november december monday friday companyname company steelyard steelyardsteelyard
balance massproperties engineer engineering engineerengineer aerospace satellite spacecraft
`;
const FIGURES = [
  '123456789012',
  '1234567890123',
  '12345678901234',
  '0123456789012',
  '111111111111',
  '121212121212',
  '123123123123',
  '112233445566',
  '987654321098',
  '000000000000',
  '1q2w3e4r5t6y',
  '1qaz2wsx3edc',
  'q1w2e3r4t5y6',
  'qwerty123456',
  'password1234',
  'password12345',
  'welcome12345',
  'iloveyou1234',
];

export const COMMON_PASSWORDS: ReadonlySet<string> = new Set([...WORDS.trim().split(/\s+/), ...FIGURES]);
