import { LEAST_PASSWORD_LENGTH } from '@/contracts/people';
import { COMMON_WORDS } from './commonPasswords';

interface Owner {
  readonly email: string;
  readonly name: string;
}

const LEETS: Readonly<Record<string, string>> = {
  '0': 'o',
  '1': 'l',
  '3': 'e',
  '4': 'a',
  '5': 's',
  '7': 't',
  '8': 'b',
  '@': 'a',
  $: 's',
  '!': 'i',
  '€': 'e',
};

/** Keys in the order in which fingers run over them, and the alphabet; from memory. */
const RUNS = ['qwertyuiopasdfghjklzxcvbnm', 'qwertzuiopasdfghjklyxcvbnm', 'azertyuiopqsdfghjklmwxcvbn', '1234567890'];
const ALPHABET = 'abcdefghijklmnopqrstuvwxyz';
const COLUMNS = '1qaz2wsx3edc4rfv5tgb6yhn7ujm';

const reversed = (text: string): string => [...text].reverse().join('');
const ENDLESS = [...RUNS, ALPHABET, COLUMNS].flatMap((run) => [run.repeat(4), reversed(run).repeat(4)]);

const plain = (text: string): string => text.normalize('NFKD').toLowerCase().replace(/\p{M}/gu, '');
const lettersOf = (text: string): string => text.replace(/[^\p{L}]/gu, '');
const unleeted = (text: string): string => [...text].map((sign) => LEETS[sign] ?? sign).join('');

/** The shortest piece that the text repeats; the text itself where there is none. */
function repeatedPiece(text: string): string {
  for (let length = 1; length <= text.length / 2; length++) {
    const piece = text.slice(0, length);
    if (piece.repeat(Math.ceil(text.length / length)).startsWith(text)) return piece;
  }
  return text;
}

/** True where the letters are common words and nothing else, one after the other. */
function isCommonWordsOnly(letters: string, most: number): boolean {
  if (letters === '') return most >= 0;
  if (most === 0) return false;
  for (let length = Math.min(letters.length, 20); length >= 3; length--) {
    if (COMMON_WORDS.has(letters.slice(0, length)) && isCommonWordsOnly(letters.slice(length), most - 1)) return true;
  }
  return false;
}

function isCommon(password: string): boolean {
  const lower = plain(password);
  const variants = [
    lettersOf(lower),
    lettersOf(unleeted(lower)),
    lettersOf(unleeted(lower.replace(/[^\p{L}]+$/u, ''))),
  ];
  return variants.some((letters) => isCommonWordsOnly(letters, 2));
}

/** True where the text is runs of three keys or more and nothing else, such as qwertyuiop123456. */
function isRunsOnly(text: string): boolean {
  const reachable = new Set([0]);
  for (let at = 0; at < text.length; at++) {
    if (!reachable.has(at)) continue;
    for (let length = 3; ENDLESS.some((run) => run.includes(text.slice(at, at + length))); length++) {
      if (at + length > text.length) break;
      reachable.add(at + length);
    }
  }
  return reachable.has(text.length);
}

const isRun = (password: string): boolean => {
  const text = plain(password).replace(/[^\p{L}\p{N}]/gu, '');
  return text.length < 4 || isRunsOnly(text);
};

/** The parts of name and address that a password must not be made of. */
function ownParts({ email, name }: Owner): string[] {
  const parts = [email, email.split('@')[0] ?? '', ...email.split(/[@.\-_+]/), name, ...name.split(/\s+/)];
  return parts.map((part) => plain(part).replace(/[^a-z0-9]/g, '')).filter((part) => part.length >= 3);
}

function isOwn(password: string, owner: Owner): boolean {
  let rest = plain(password).replace(/[^a-z0-9]/g, '');
  for (const part of ownParts(owner).sort((a, b) => b.length - a.length)) rest = rest.replaceAll(part, '');
  return rest.replace(/\d/g, '').length < 4 && rest.length < plain(password).replace(/[^a-z0-9]/g, '').length;
}

/**
 * What is wrong with a new password, as a sentence; null where nothing is. Long enough, not a common one in disguise,
 * no run of keys, no piece repeated, not made of the person's own name or address. Checked here alone: no password is
 * looked up anywhere else.
 */
export function passwordFault(password: string, owner: Owner): string | null {
  if ([...password].length < LEAST_PASSWORD_LENGTH) return `At least ${LEAST_PASSWORD_LENGTH} characters, please.`;
  if (isOwn(password, owner)) return 'That is your own name or address. Choose something that others can’t know.';
  if (repeatedPiece(plain(password)).length <= 4)
    return 'That repeats itself. Four words that don’t belong together are good.';
  if (isRun(password)) return 'That is a run of keys, among the first to be tried. Four words are better.';
  if (isCommon(password))
    return 'That is among the first to be tried. Four words that don’t belong together are better.';
  return null;
}
