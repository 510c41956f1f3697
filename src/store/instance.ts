/** An instance of the engine: bounded memory, no files but those in the folders it is given, no network. */
import { statSync } from 'node:fs';
import { resolve } from 'node:path';
import { DuckDBInstance } from '@duckdb/node-api';
import { UserError } from '../errors.js';
import { translateError } from './messages.js';
import { scratchFolder } from './scratch.js';
import { quoteText } from './sql.js';

/** Beyond it the engine spills to the scratch folder; its own default is most of the machine, beside our heap. [judgement] */
const MEMORY_LIMIT = '700MB';

/** Starts it on a file, or on `:memory:`. @throws UserError when the file is locked, a folder or no database. */
export async function startInstance(
  path: string,
  readOnly: boolean,
  folders: readonly string[],
): Promise<DuckDBInstance> {
  const allowed = [scratchFolder(), ...folders.map((folder) => resolve(folder))];
  const file = path === ':memory:' ? undefined : path;
  if (file !== undefined && statSync(file, { throwIfNoEntry: false })?.isDirectory() === true)
    throw new UserError('a folder stands where the database belongs; move it away or rename it', { file });
  try {
    const instance = await DuckDBInstance.create(path, {
      temp_directory: scratchFolder(),
      memory_limit: MEMORY_LIMIT,
      access_mode: readOnly ? 'READ_ONLY' : 'AUTOMATIC',
      autoinstall_known_extensions: 'false',
      autoload_known_extensions: 'false',
    });
    try {
      const connection = await instance.connect();
      await connection.run(`SET allowed_directories = [${allowed.map((name) => quoteText(`${name}/`)).join(', ')}]`);
      await connection.run('SET enable_external_access = false');
      connection.closeSync();
    } catch (error) {
      instance.closeSync();
      throw error;
    }
    return instance;
  } catch (error) {
    throw translateError(error, file);
  }
}
