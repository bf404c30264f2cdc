import { drawJob, TARGET_MM_S } from './simulate/draw-job';
import { productWay } from './simulate/product-way';
import { textbookWay } from './simulate/textbook-way';
import { reasonsTable, resultsTable, type Pair } from './simulate/tally';

const JOBS = 1000;
/** So far apart that the streams of two jobs do not touch. */
const STRIDE = 7919;

const seed = Number(process.argv[2] ?? '20261201');
if (!Number.isInteger(seed) || seed < 0) {
  console.error(
    `error: the seed is ${process.argv[2] ?? ''}, and a whole number from 0 up was expected.`,
  );
  process.exit(1);
}

const pairs = Array.from({ length: JOBS }, (_, i): Pair => {
  const job = drawJob(seed + i * STRIDE, 'as stated');
  return { job, textbook: textbookWay(job), product: productWay(job) };
});

console.log(
  `${JOBS} simulated balance jobs, seed ${seed}, ${new Date().toISOString().slice(0, 10)}`,
);
console.log(`target: 1x velocity at every point read at most ${TARGET_MM_S} mm/s rms`);
console.log('(a) textbook formula without any check; (b) the rules of this product\n');
console.log(resultsTable(pairs));
console.log(`\nhow the jobs ended in (b)\n\n${reasonsTable(pairs)}`);
