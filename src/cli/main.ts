#!/usr/bin/env node
import { exitCodeOf, formatError } from '../errors.js';
import { printError } from './output/print.js';
import { runProgram } from './program.js';

// A reader that closes the pipe early (`| head`) has seen enough: that is no error.
for (const stream of [process.stdout, process.stderr]) {
  stream.on('error', (error: NodeJS.ErrnoException) => {
    if (error.code === 'EPIPE') process.exit(0);
    throw error;
  });
}

try {
  process.exitCode = await runProgram(process.argv);
} catch (error) {
  printError(formatError(error));
  process.exitCode = exitCodeOf(error);
}
