// The whole screening with all its outputs, in a process of its own. Prints {seconds, cpuSeconds, peakMB, threads, steps}.
import { join } from 'node:path';
import { screenStudy } from '../../dist/index.js';
import { threadsFor } from '../../dist/screening/assess-threads.js';

const started = process.hrtime.bigint();
const since = () => Number(process.hrtime.bigint() - started) / 1e9;
const steps = [];
let current = { step: 'starting', from: 0 };
const turn = (step) => {
  if (step === current.step) return;
  steps.push({ step: current.step, seconds: since() - current.from });
  current = { step, from: since() };
};
const { summary } = await screenStudy(join(process.argv[2], 'study.yaml'), {
  made: new Date('2026-06-11T00:00:00Z'),
  onProgress: ({ step }) => turn(step),
});
turn('end');
const { user, system } = process.cpuUsage();
process.stdout.write(
  JSON.stringify({
    seconds: since(),
    cpuSeconds: (user + system) / 1e6,
    peakMB: process.resourceUsage().maxRSS / 1024,
    threads: threadsFor(summary.buildings),
    steps,
  }),
);
