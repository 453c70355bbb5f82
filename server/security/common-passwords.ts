/**
 * Long passwords that guessers try first (NIST SP 800-63B-4 asks for such a list). Short ones need no place here, since
 * nothing below 15 characters is taken; from memory of published lists.
 */
const COMMON = new Set([
  'passwordpassword',
  'password12345678',
  'passwordpassword1',
  '123456789012345',
  '1234567890123456',
  '12345678901234567890',
  'qwertyuiopasdfgh',
  'qwertyuiopasdfghjkl',
  'qwertyuiop123456',
  'qwerty1234567890',
  'letmeinletmeinletmein',
  'iloveyouiloveyou',
  'administrator123',
  'correct horse battery staple',
  'correcthorsebatterystaple',
  'aaaaaaaaaaaaaaa',
  '111111111111111',
  '000000000000000',
  'asdfghjklasdfghjkl',
  'thequickbrownfox',
  'abcdefghijklmno',
  'abcdefghijklmnop',
  'trustno1trustno1',
  'welcomewelcome12',
  'changemechangeme',
  'monkeymonkeymonkey',
  'dragondragondragon',
  'sunshinesunshine',
  'princessprincess',
  'footballfootball',
]);

/** Why a password is too easily guessed, or null. @param context words the person is known by: address, name, product */
export function weaknessOf(password: string, context: readonly string[]): string | null {
  const folded = password.toLowerCase();
  if (COMMON.has(folded) || COMMON.has(folded.replaceAll(' ', '')))
    return "This password is on every guesser's list; choose another";
  if (new Set(folded).size < 5) return 'This password repeats itself; choose another';
  const named = context.map((word) => word.toLowerCase()).find((word) => word.length >= 5 && folded.includes(word));
  return named && folded.replaceAll(named, '').length < 10
    ? 'This password is mostly your own name or address; choose another'
    : null;
}
