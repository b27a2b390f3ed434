import { parsePlainDate, type PlainDate } from '#shared/kernel/plain-date.ts';
import { MARKETS, type Market } from '#shared/law/types.ts';

export type Command = 'check' | 'label' | 'read' | 'schema';

/** The command line, read. */
export interface Arguments {
  readonly command: Command;
  /** A file name, `-` for standard input, or the schema's name. */
  readonly file: string;
  readonly markets: readonly Market[];
  readonly placed?: PlainDate;
  readonly available?: PlainDate;
  readonly out?: string;
  readonly category?: string;
}

export const USAGE = `Usage:
  colophon check  FILE.json|FILE.jsonl|-  [--market EU]... [--placed YYYY-MM-DD] [--available YYYY-MM-DD]
  colophon label  FILE.json|-  --out label.pdf  [--market EU]
  colophon read   FILE.txt|-  --market EU --category body-wash
  colophon schema formula|result|reading
`;

const COMMANDS: readonly Command[] = ['check', 'label', 'read', 'schema'];
const OPTIONS = ['--market', '--placed', '--available', '--out', '--category'] as const;
type Option = (typeof OPTIONS)[number];

/** Reads the words after the program's name; every mistake in a sentence. */
export function readArguments(words: readonly string[]): { arguments: Arguments } | { mistakes: readonly string[] } {
  const mistakes: string[] = [];
  const plain: string[] = [];
  const given: Record<Option, string[]> = { '--market': [], '--placed': [], '--available': [], '--out': [], '--category': [] };
  const queue = [...words];
  while (queue.length > 0) {
    const word = queue.shift()!;
    if (!word.startsWith('--')) {
      plain.push(word);
      continue;
    }
    const [name, ...rest] = word.split('=');
    const option = OPTIONS.find((one) => one === name);
    const value = rest.length > 0 ? rest.join('=') : queue.shift();
    if (!option) mistakes.push(`${name} is not an option.`);
    else if (value === undefined) mistakes.push(`${name} needs a value.`);
    else given[option].push(value);
  }
  const command = COMMANDS.find((one) => one === plain[0]);
  if (!command) mistakes.push(plain[0] === undefined ? 'A command is missing.' : `${plain[0]} is not a command.`);
  if (command && plain.length !== 2) mistakes.push(plain.length < 2 ? `${command} needs a file.` : `${command} takes one file, not ${plain.length - 1}.`);
  const markets = given['--market'].flatMap((text) => {
    const market = MARKETS.find((one) => one === text);
    if (!market) mistakes.push(`--market: not known: "${text}". Choose ${MARKETS.join(', ')}.`);
    return market ? [market] : [];
  });
  const placed = readDay('--placed', given['--placed'].at(-1), mistakes);
  const available = readDay('--available', given['--available'].at(-1), mistakes);
  const out = given['--out'].at(-1);
  const category = given['--category'].at(-1);
  if (command === 'label' && out === undefined) mistakes.push('label needs --out with the name of the PDF.');
  if (mistakes.length > 0 || !command) return { mistakes };
  return {
    arguments: {
      command,
      file: plain[1]!,
      markets: [...new Set(markets)],
      ...(placed && { placed }),
      ...(available && { available }),
      ...(out !== undefined && { out }),
      ...(category !== undefined && { category }),
    },
  };
}

function readDay(option: Option, text: string | undefined, mistakes: string[]): PlainDate | undefined {
  if (text === undefined) return undefined;
  const day = parsePlainDate(text);
  if (!day) mistakes.push(`${option}: not a day that exists: "${text}". Write it as YYYY-MM-DD.`);
  return day ?? undefined;
}
