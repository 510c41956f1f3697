/** What the code of an era asked of a system, and the memory of it that cases share. */
import type { System } from '../building.js';
import type { CodeEdition, DesignFacts, EraDesign } from '../capacity/edition.js';
import type { CarriedId } from '../capacity/families.js';
import { cite } from '../source.js';
import type { Verified } from '../source.js';
import type { Trace } from '../trace.js';
import { entryOf } from './case-memory.js';
import type { Design } from './case-memory.js';
import { editionOf } from './code-history.js';
import type { EditionId } from './code-history.js';
import type { AssessContext } from './context.js';
import { hasNoRow } from './edition-rows.js';

const MARKS: Readonly<Record<Verified, string>> = {
  printed: 'read in print',
  restated: 'restated',
  memory: 'from memory',
  judgement: 'as the study states it',
  mechanics: 'mechanics',
};

/** What the edition asked of the system, with the edition's own period and the place's own inputs. */
export function eraDesign(edition: EditionId, facts: DesignFacts, context: AssessContext, trace?: Trace): EraDesign {
  const history = context.settings.codeHistory!;
  const row = editionOf(edition, history);
  const { title, source, verified, note } = row;
  trace?.choice({
    question: 'Code of the era',
    taken: title,
    because: `${cite(source)}, ${MARKS[verified]}${note === undefined ? '' : `; ${note}`}`,
    others: [],
  });
  const stated: unknown = history.editions[edition as CarriedId];
  // an era exists only where something is stated for its edition, and that is of the type it reads
  return (row as CodeEdition).design(facts, stated, trace);
}

/** The memory of capacities that all cases of a system, an edition and a level of retrofit share. */
export function designOf(
  system: System,
  edition: EditionId | null,
  retrofit_level: number,
  strengthened: boolean,
  { caseMemory, settings }: AssessContext,
): Design {
  const key = `${system}|${String(edition)}|${String(retrofit_level)}|${String(strengthened)}`;
  return entryOf(caseMemory.designs, key, () => ({
    dependsOn:
      edition === null || hasNoRow(system, edition, settings.codeHistory)
        ? 'nothing'
        : editionOf(edition, settings.codeHistory!).dependsOn(system),
    found: new Map(),
    last: null,
  }));
}
