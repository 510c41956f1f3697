/** Assessing in this thread, or in several: the results are the same to the bit. */
import { existsSync } from 'node:fs';
import { availableParallelism } from 'node:os';
import { fileURLToPath } from 'node:url';
import { Worker } from 'node:worker_threads';
import { compileContext } from '../engineering/assess/context.js';
import type { AssessSettings } from '../engineering/assess/settings.js';
import type { YearPools } from '../engineering/building-columns.js';
import { answerOf } from '../engineering/priority/exceedance.js';
import type { SetAnswer, SetTask } from '../engineering/priority/exceedance.js';
import type { Mixture } from '../engineering/priority/mixture.js';
import { bandsOf } from '../engineering/priority/rank-bands.js';
import type { Bands } from '../engineering/priority/rank-bands.js';
import type { HazardGrids } from '../engineering/spectrum/grid.js';
import { Bug } from '../errors.js';
import { BlockAssessor } from './assess-block.js';
import type { BlockResult } from './assess-block.js';
import { mixturesOf } from './flat-mixtures.js';
import type { FlatArrays } from './flat-mixtures.js';
import { memoryOf, sharedGrids, unpackBlock } from './thread-messages.js';
import type { BandBasis, FromThread, PackedBlock, ToThread } from './thread-messages.js';

export interface Assessor {
  /** Blocks worth handing over before the first comes back. */
  readonly threads: number;
  readonly begin: (settings: AssessSettings, pools: YearPools, grids: HazardGrids) => void;
  /** Takes the memory of the block over. */
  readonly assess: (block: PackedBlock) => Promise<BlockResult>;
  /** The answer of a set of mixtures, all as one, to a task. */
  readonly answer: (set: Mixture, of: SetTask) => Promise<SetAnswer>;
  /** Chances and bands of the buildings with these mixtures. */
  readonly bands: (mixtures: FlatArrays, basis: BandBasis) => Promise<Bands>;
  readonly close: () => Promise<void>;
}

/** Below it a thread's start costs more than it saves. */
const WORTH_THREADS = 50_000;
const MOST_THREADS = 4;

/** Room for the objects of a building that do not outlive it: cleared away less often, most are gone by then. */
const YOUNG_MB = 64;

const BODY = new URL('./assess-worker.js', import.meta.url);

/** Threads for an inventory of `count` buildings; 1 where the built thread body is missing, as when tests run from the source. */
export function threadsFor(count: number): number {
  if (count < WORTH_THREADS || !existsSync(fileURLToPath(BODY))) return 1;
  return Math.max(1, Math.min(MOST_THREADS, availableParallelism(), Math.ceil(count / WORTH_THREADS)));
}

/** Starts the threads; `close` it when done. */
export function startAssessor(threads: number): Assessor {
  if (threads > 1) return new Threads(threads);
  let here: BlockAssessor | null = null;
  return {
    threads: 1,
    begin: (settings, pools, grids) => {
      here = new BlockAssessor(compileContext(settings, grids), pools);
    },
    assess: (block) =>
      here === null
        ? Promise.reject(new Bug('a block before the settings'))
        : Promise.resolve(here.assess(unpackBlock(block))),
    answer: (set, of) => Promise.resolve(answerOf([set], of)),
    bands: (mixtures, basis) => Promise.resolve(bandsOf(mixturesOf(mixtures), basis, basis.zone)),
    close: () => Promise.resolve(),
  };
}

interface Waiting {
  readonly resolve: (result: BlockResult | Bands | SetAnswer) => void;
  readonly reject: (error: Error) => void;
}

class Threads implements Assessor {
  readonly threads: number;
  readonly #workers: readonly Worker[];
  readonly #load: number[];
  readonly #waiting = new Map<number, Waiting & { readonly worker: number }>();
  #task = 0;

  constructor(threads: number) {
    this.threads = threads;
    this.#load = new Array<number>(threads).fill(0);
    this.#workers = Array.from({ length: threads }, (_, at) => {
      const worker = new Worker(BODY, { resourceLimits: { maxYoungGenerationSizeMb: YOUNG_MB } });
      worker.on('message', (message: FromThread) => {
        this.#answered(message);
      });
      worker.on('error', (error) => {
        this.#broken(at, error instanceof Error ? error : new Bug(String(error)));
      });
      worker.on('exit', (code) => {
        this.#broken(at, new Bug(`a thread of the assessment ended with code ${String(code)}`));
      });
      return worker;
    });
  }

  begin = (settings: AssessSettings, pools: YearPools, grids: HazardGrids): void => {
    const message = { kind: 'begin', settings, pools, grids: sharedGrids(grids) } satisfies ToThread;
    for (const worker of this.#workers) worker.postMessage(message);
  };

  assess = (block: PackedBlock): Promise<BlockResult> =>
    this.#ask((task) => ({ kind: 'block', task, block }), memoryOf(block)) as Promise<BlockResult>;

  answer = (set: Mixture, of: SetTask): Promise<SetAnswer> =>
    this.#ask((task) => ({ kind: 'set', task, set, of })) as Promise<SetAnswer>;

  bands = (mixtures: FlatArrays, basis: BandBasis): Promise<Bands> =>
    this.#ask((task) => ({ kind: 'bands', task, mixtures, basis })) as Promise<Bands>;

  close = async (): Promise<void> => {
    await Promise.all(this.#workers.map((worker) => worker.removeAllListeners('exit').terminate()));
  };

  /** Hands a task to the thread with the fewest. */
  #ask(message: (task: number) => ToThread, given: ArrayBuffer[] = []): Promise<BlockResult | Bands | SetAnswer> {
    const worker = this.#load.indexOf(Math.min(...this.#load));
    const task = this.#task;
    this.#task += 1;
    this.#load[worker]! += 1;
    return new Promise((resolve, reject) => {
      this.#waiting.set(task, { resolve, reject, worker });
      this.#workers[worker]!.postMessage(message(task), given);
    });
  }

  #answered(message: FromThread): void {
    const waiting = this.#waiting.get(message.task);
    if (waiting === undefined) return;
    this.#waiting.delete(message.task);
    this.#load[waiting.worker]! -= 1;
    if (message.kind === 'done') waiting.resolve(message.result);
    else waiting.reject(new Bug(message.message));
  }

  #broken(at: number, error: Error): void {
    for (const [task, { worker, reject }] of this.#waiting) {
      if (worker !== at) continue;
      this.#waiting.delete(task);
      reject(error);
    }
  }
}
