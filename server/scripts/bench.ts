import { lineAsText, type BenchPart } from './bench/bench-part';
import { adoptionPreview } from './bench/adoption-preview';
import { coreEnergy } from './bench/core-energy';
import { coreLowest } from './bench/core-lowest';
import { coreRanking } from './bench/core-ranking';
import { coverage } from './bench/coverage';
import { imports } from './bench/imports';
import { rankings } from './bench/rankings';
import { reduction } from './bench/reduction';

/** All parts in the order in which they run; `npm run bench -- core-energy` runs the named ones only. A goal that is not met ends it with 1. */
const PARTS: readonly BenchPart[] = [
  coreEnergy,
  coreRanking,
  coreLowest,
  coverage,
  reduction,
  adoptionPreview,
  rankings,
  imports,
];

const wanted = process.argv.slice(2);
const unknown = wanted.filter((name) => !PARTS.some((part) => part.name === name));
if (unknown.length > 0) {
  console.error(
    `No such part: ${unknown.join(', ')}. There are: ${PARTS.map((part) => part.name).join(', ')}.`,
  );
  process.exitCode = 2;
} else {
  for (const part of PARTS) {
    if (wanted.length > 0 && !wanted.includes(part.name)) continue;
    for (const line of await part.run()) {
      console.log(lineAsText(part.name, line));
      if (line.goal?.met === false) process.exitCode = 1;
    }
  }
}
