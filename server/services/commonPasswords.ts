/** Long passwords that anybody tries first, in lower case; from memory, with this register's own words added. */
export const COMMON_PASSWORDS: ReadonlySet<string> = new Set([
  '123456789012', '1234567890123', '12345678901234', '123456123456', '111111111111', '000000000000', '121212121212', '123123123123',
  'password1234', 'password12345', 'passwordpassword', 'password123456', 'qwertyuiop12', 'qwertyuiop123', 'qwertyuiopas', 'qwertyqwerty',
  'qwerty123456', 'qwerty1234567', '1q2w3e4r5t6y', '1qaz2wsx3edc', 'abcdefghijkl', 'abcabcabcabc', 'abcd12345678', 'abc123abc123',
  'iloveyou1234', 'iloveyouiloveyou', 'letmeinletmein', 'welcome12345', 'welcomewelcome', 'administrator', 'changeme1234', 'changemechangeme',
  'drenchleaf12', 'drenchleaf123', 'drenchleaf1234', 'drenchleafdrenchleaf', 'soildrench12', 'foliarspray1', 'applicator12', 'certifier123',
  'correcthorsebatterystaple', 'contraseña123', 'contrasena123', 'contraseñacontraseña', 'teamoteamoteamo',
])
