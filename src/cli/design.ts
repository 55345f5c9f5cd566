/**
 * The planner without a screen: prints the choices for a request as JSON.
 *
 *     npm run --silent design -- request.json        (- reads standard input, --help says what a request holds)
 *
 * Exit status 0: choices were printed; 2: the request cannot be read or met, and {"error": ...} was printed.
 */
import { readFileSync } from 'node:fs';
import { proposeDesigns } from '../lib/core/design/propose/propose-designs.ts';
import { readRequest, REQUEST_HELP } from './design-request.ts';

const print = (value: unknown): void => console.log(JSON.stringify(value, null, 2));

const name = process.argv[2];
if (name === undefined || name === '--help') {
  console.log(REQUEST_HELP);
  process.exitCode = name === undefined ? 2 : 0;
} else {
  process.exitCode = await answer(name);
}

async function answer(file: string): Promise<number> {
  let text: string;
  try {
    text = readFileSync(file === '-' ? 0 : file, 'utf8');
  } catch (thrown) {
    print({ error: { tag: 'unreadable', why: (thrown as Error).message } });
    return 2;
  }
  const read = readRequest(text);
  if (!('request' in read)) {
    print({ error: { tag: 'bad-request', ...read } });
    return 2;
  }
  const proposal = await proposeDesigns(read.request);
  if (!proposal.ok) {
    print({ error: proposal.error });
    return 2;
  }
  const { choices, recommended, smallestBalanced } = proposal.value;
  print({ request: read.request, choices, recommended, smallestBalanced });
  return 0;
}
