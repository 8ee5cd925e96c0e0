// `npm run verification`: writes docs/verification-book.md from the cases and the engine as they are.
import { mkdirSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { computeBook } from '#shared/verification/book.ts';
import { summarise } from '#shared/verification/summary.ts';
import { PROJECT_ROOT } from './project-paths.mjs';
import { verificationBookText } from './verification-book-text.ts';

const file = path.join(PROJECT_ROOT, 'docs', 'verification-book.md');
const book = computeBook();
const { cases, reproduced, outOfScope } = summarise(book);

mkdirSync(path.dirname(file), { recursive: true });
writeFileSync(file, verificationBookText(book));
console.log(
  `docs/verification-book.md: ${reproduced} of ${cases} cases reproduced, ${outOfScope} not computed`,
);
if (reproduced < cases) process.exitCode = 1;
