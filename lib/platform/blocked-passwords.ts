/** Passwords of twelve characters and more that are guessed first, in lower case without spaces and dashes. Length alone does not save them. */
export const BLOCKED_PASSWORDS: ReadonlySet<string> = new Set(
  `
    123456789012 1234567890123 12345678901234 1234567890qwerty 123456789123 1q2w3e4r5t6y 1q2w3e4r5t6y7u 1qaz2wsx3edc 1qaz2wsx3edc4rfv
    a1b2c3d4e5f6 aa123456789a abc123456789 abc123abc123 abcd1234abcd abcdef123456 abcdefghijkl abcdefghijklm admin1234567 admin12345678
    adminadminadmin administrator administrator1 administrator123 arsenal12345 asdfasdfasdf asdfghjkl123 asdfghjklqwe autumn202026
    baseball1234 batmanbatman changeit1234 changeme1234 changemechangeme charlie12345 chelsea12345 computer1234 correcthorsebatterystaple
    december2026 default12345 dragondragon facebook1234 february2026 football1234 friday123456 google123456 iloveyou1234 iloveyou12345
    iloveyouforever iloveyouiloveyou internet1234 january12345 jennifer1234 letmein12345 letmeinletmein liverpool123 liverpool1234
    lockwire1234 lockwire2026 lockwirelockwire manchester123 manutd123456 michael12345 minecraft123 monday123456 monkey123456 motorsport12
    motorsport123 motorsport1234 mypassword123 mypassword1234 newpassword123 november2026 october202026 p@ssw0rd1234 p@ssword1234
    paddock12345 passw0rd1234 password1234 password12345 password123456 password123password passwordpassword pitexit12345 pitlane12345
    pokemon12345 princess1234 qazwsxedcrfv qwerty123456 qwerty1234567 qwerty12345678 qwertyqwerty qwertyuiop12 qwertyuiop123 qwertyuiopasdf
    qwertyuiopasdfgh racecar12345 racing123456 rootrootroot samsung12345 scrutineer12 scrutineer123 scrutineering secret123456 secretsecret
    september2026 spiderman1234 spring202026 starwars1234 summer202026 sunshine1234 superadmin123 superman1234 temporary123
    temporarypassword temppassword thisisapassword trackday1234 trackdays1234 trackdaytrackday trustno1trustno1 welcome12345 welcome123456
    welcomewelcome whatever1234 winter202026 zxcvbnmasdfg
  `
    .trim()
    .split(/\s+/),
)
