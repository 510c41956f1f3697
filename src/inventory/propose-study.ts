/** The study file that `init` proposes for a table: what is known is filled in, what only its owner knows is a question. */
import { basename } from 'node:path';
import { FAMILY_IDS } from '../engineering/capacity/families.js';
import { findColumn } from '../engineering/columns.js';
import { BLANK } from '../study/inventory-schema.js';
import { foldWord } from './cell.js';
import { detectDecimal } from './decimal-mark.js';
import { guessSystem, guessUse } from './guess-words.js';
import { isBlank, proposeMapping } from './propose-mapping.js';
import type { Proposal } from './propose-mapping.js';
import { readSample } from './sample.js';
import type { Sample } from './sample.js';

export interface ProposedStudy {
  /** The text of a study.yaml; it cannot run before the questions about the hazard and the code history are answered. */
  readonly text: string;
  readonly questions: readonly string[];
  readonly proposal: Proposal;
}

const MARK = '# QUESTION:';
const MOST_WORDS = 60;

/** Reads the table at `path` and proposes a study for it. @throws UserError when the table cannot be read. */
export function proposeStudy(path: string): ProposedStudy {
  const sample = readSample(path);
  const decimal = detectDecimal(sample.rows, sample.delimiter, BLANK);
  const proposal = proposeMapping(sample.header, sample.rows, decimal.mark);
  const words = unknownWords(sample, proposal, 'use');
  const lines = [
    `title: ${quote(basename(path).replace(/\.[^.]*$/, ''))}  ${MARK} what is the study called?`,
    '',
    'inventory:',
    `  file: ${quote(basename(path))}`,
    `  encoding: ${sample.encoding}`,
    `  delimiter: ${sample.delimiter === '\t' ? 'tab' : quote(sample.delimiter)}`,
    `  decimal: ${quote(decimal.mark)}${decimal.question === undefined ? '' : `  ${MARK} ${decimal.question}`}`,
    `  blank: [${BLANK.map(quote).join(', ')}]`,
    '  columns:',
    ...columnLines(proposal),
    ...proposal.questions.map((question) => `  ${MARK} ${question}`),
    ...proposal.questions
      .filter((question) => question.includes('merge_rows_by'))
      .map(() => `  # merge_rows_by: ${quote(idOf(proposal))}`),
    ...siteLines(proposal, words),
    ...proposal.unused.map((name) => `  # not used: ${quote(name)}`),
    '',
    ...wordLines({ use: words, system: unknownWords(sample, proposal, 'system') }),
    '',
    `hazard:  ${MARK} the design spectra of the site, and who reads which`,
    '  spectra:',
    '    design: {code: asce7-22-two-period, sds_g: , sd1_g: , tl_s: , return_period_years: }',
    '    # a grid of hazard instead: map: {code: hazard-grid, file: map.csv, unit: g, interpolation: log-log, return_period_years: }',
    '  levels:',
    '    - {title: design level, spectrum: design}',
    '',
    `code_history:  ${MARK} which editions did the place use, with which hazard inputs, enforced from when?`,
    '  place: ',
    `  # families: ${FAMILY_IDS.join(', ')}`,
    '  family: us-ubc-asce7',
    '  seismic_design_enforced_from: ',
    '  editions: ',
    '    # the editions the place used, each with its hazard inputs, for instance ubc-1997: {ca_g: , cv_g: , zone_factor: , nv: }',
    '',
    `# system_prior: system-prior.csv  ${MARK} chances of the lateral system where it is not known`,
    'ranking:',
    '  rank_by: people',
    `  list_size: 20  ${MARK} how many buildings can be assessed?`,
    '',
  ];
  const questions = lines.flatMap((line) =>
    line.includes(MARK) ? [line.slice(line.indexOf(MARK) + MARK.length).trim()] : [],
  );
  return { text: lines.join('\n'), questions, proposal };
}

// A JSON string is a YAML string.
function quote(text: string): string {
  return JSON.stringify(text);
}

function idOf(proposal: Proposal): string {
  return proposal.columns.find(({ ours }) => ours === 'id')?.theirs ?? '';
}

function columnLines(proposal: Proposal): string[] {
  const lines = proposal.columns.map(({ ours, theirs, unit, question }) => {
    const right = unit === undefined ? quote(theirs) : `{column: ${quote(theirs)}, unit: ${unit}}`;
    return `    ${ours}: ${right}${question === undefined ? '' : `  ${MARK} ${question}`}`;
  });
  return idOf(proposal) === '' ? [`    id: ""  ${MARK} which column names a building?`, ...lines] : lines;
}

interface UnknownWord {
  readonly theirs: string;
  readonly rows: number;
  readonly guess: string | undefined;
}

// Their words that are none of ours, the most frequent first.
function unknownWords(sample: Sample, proposal: Proposal, column: 'use' | 'system'): UnknownWord[] {
  const theirs = proposal.columns.find(({ ours }) => ours === column)?.theirs;
  if (theirs === undefined) return [];
  const position = sample.header.indexOf(theirs);
  // Spellings that the study takes for one word count as the first of them.
  const spelling = new Map<string, string>();
  const counts = new Map<string, number>();
  for (const row of sample.rows) {
    const cell = row[position]?.trim() ?? '';
    if (isBlank(cell)) continue;
    const folded = foldWord(cell);
    const word = spelling.get(folded) ?? cell;
    spelling.set(folded, word);
    counts.set(word, (counts.get(word) ?? 0) + 1);
  }
  const ours = findColumn(column)?.words ?? [];
  return [...counts]
    .filter(([word]) => !ours.includes(foldWord(word)))
    .sort(([a, n], [b, m]) => m - n || (a < b ? -1 : 1))
    .slice(0, MOST_WORDS)
    .map(([word, rows]) => ({ theirs: word, rows, guess: column === 'use' ? guessUse(word) : guessSystem(word) }));
}

function siteLines(proposal: Proposal, words: readonly UnknownWord[]): string[] {
  const sites = words.filter(({ guess }) => guess === 'no building');
  const column = proposal.columns.find(({ ours }) => ours === 'use')?.theirs;
  if (sites.length === 0 || column === undefined) return [];
  const values = sites.map(({ theirs }) => quote(theirs)).join(', ');
  return [
    `  # no_building: {column: ${quote(column)}, values: [${values}]}  ${MARK} are these sites without a building?`,
  ];
}

// Commented out as a whole: a guess at what a word means is for the owner to take over.
function wordLines(words: Readonly<Record<string, readonly UnknownWord[]>>): string[] {
  const lines = Object.entries(words).flatMap(([column, all]) => {
    const line = ({ theirs, rows, guess }: UnknownWord): string =>
      `#     ${quote(theirs)}: ${guess ?? 'unknown'}  ${MARK} ${rows} sampled rows; ${guess === undefined ? `which ${column} is it?` : `is it ${guess}?`}`;
    const ofBuildings = all.filter(({ guess }) => guess !== 'no building');
    return ofBuildings.length === 0 ? [] : [`#   ${column}:`, ...ofBuildings.map(line)];
  });
  return lines.length === 0 ? [] : ['# words:', ...lines, ''];
}
