/** The body of a thread that assesses: settings first, then block after block, and the bands of the ranking in the end. */
import { parentPort } from 'node:worker_threads';
import { compileContext } from '../engineering/assess/context.js';
import { answerOf } from '../engineering/priority/exceedance.js';
import type { SetAnswer } from '../engineering/priority/exceedance.js';
import { bandsOf } from '../engineering/priority/rank-bands.js';
import type { Bands } from '../engineering/priority/rank-bands.js';
import { Bug } from '../errors.js';
import { BlockAssessor } from './assess-block.js';
import type { BlockResult } from './assess-block.js';
import { mixturesOf } from './flat-mixtures.js';
import { memoryOf, unpackBlock } from './thread-messages.js';
import type { FromThread, ToThread } from './thread-messages.js';

const port = parentPort;
if (port === null) throw new Bug('assess-worker is started as a thread');
let assessor: BlockAssessor | null = null;

function workedOut(message: Exclude<ToThread, { kind: 'begin' }>): BlockResult | Bands | SetAnswer {
  if (message.kind === 'set') return answerOf([message.set], message.of);
  if (message.kind === 'bands') return bandsOf(mixturesOf(message.mixtures), message.basis, message.basis.zone);
  if (assessor === null) throw new Bug('a block before the settings');
  return assessor.assess(unpackBlock(message.block));
}

function answer(message: Exclude<ToThread, { kind: 'begin' }>): FromThread {
  const { task } = message;
  try {
    return { kind: 'done', task, result: workedOut(message) };
  } catch (error) {
    return { kind: 'failed', task, message: error instanceof Error ? (error.stack ?? error.message) : String(error) };
  }
}

port.on('message', (message: ToThread) => {
  if (message.kind === 'begin')
    assessor = new BlockAssessor(compileContext(message.settings, message.grids), message.pools);
  else {
    const told = answer(message);
    port.postMessage(told, memoryOf(told));
  }
});
