/** The study a command means when none is named. */
import { existsSync, readdirSync } from 'node:fs';
import { UserError } from '../errors.js';

/** The named study file, else ./study.yaml, else the only YAML file of the current folder. @throws UserError when none or several could be meant. */
export function findStudy(named: string | undefined): string {
  if (named !== undefined) return named;
  if (existsSync('study.yaml')) return 'study.yaml';
  const found = readdirSync('.').filter((name) => /\.ya?ml$/i.test(name));
  const [only] = found;
  if (only !== undefined && found.length === 1) return only;
  throw new UserError(
    only === undefined
      ? 'no study file in this folder; name one with --study, or make one with `swaymark init <table>`'
      : `several study files could be meant (${found.slice(0, 5).join(', ')}); name one with --study`,
  );
}
