#!/usr/bin/env node
import { EXIT, exitCodeOf, formatError } from '../errors.js';
import { printError } from './output/print.js';
import { runProgram } from './program.js';

const REASONS: Readonly<Record<string, string>> = {
  ENOSPC: 'no space left',
  EIO: 'the device reports an error',
  EBADF: 'it is closed',
};

for (const stream of [process.stdout, process.stderr]) {
  stream.on('error', (error: NodeJS.ErrnoException) => {
    // A reader that closes the pipe early (`| head`) has seen enough: that is no error.
    if (error.code === 'EPIPE') process.exit(0);
    // What cannot be written here may still be told on the other stream.
    if (stream === process.stdout)
      printError(`cannot write to the terminal or pipe: ${REASONS[error.code ?? ''] ?? error.message}`);
    process.exit(EXIT.user);
  });
}

try {
  process.exitCode = await runProgram(process.argv);
} catch (error) {
  printError(formatError(error));
  process.exitCode = exitCodeOf(error);
}
