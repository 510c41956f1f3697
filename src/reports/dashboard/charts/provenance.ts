/** Where the numbers came from: per attribute given, inferred, default, unknown. */
import { formatCount, formatShare } from '../../../engineering/format.js';
import type { PageData } from '../../../engineering/page-contract.js';
import { attributeTotal, decisiveAttributes, isNeeded, shareNotGiven } from '../answers.js';
import { columnsOf } from './chart.js';
import type { Chart } from './chart.js';

const PARTS = ['given', 'inferred', 'default', 'unknown'] as const;

/** The provenance chart. */
export function provenanceChart({ summary }: PageData): Chart {
  const attributes = decisiveAttributes(summary);
  const parts = attributes.flatMap((attribute) => {
    const total = attributeTotal(attribute);
    let reached = 0;
    return PARTS.map((part) => {
      const from = reached;
      reached += attribute[part] / total;
      return { title: attribute.title, part, from, to: reached };
    });
  });
  const labels = attributes.map((attribute) => ({ title: attribute.title, label: formatShare(1 - shareNotGiven(attribute)) }));
  return {
    id: 'provenance',
    title: 'Values given, inferred, set by default or unknown, for the attributes that decide most; figures at the right: share given',
    sentence: sentence(attributes.filter(isNeeded).map((attribute) => ({ title: attribute.title, share: shareNotGiven(attribute) }))),
    table: {
      caption: 'Buildings by the origin of each attribute, all attributes',
      head: ['Attribute', 'Given', 'Inferred', 'Default', 'Unknown'],
      rows: summary.attributes.map((attribute) => [attribute.title, ...PARTS.map((part) => formatCount(attribute[part]))]),
    },
    data: { parts: columnsOf(parts), labels: columnsOf(labels) },
    renderer: 'svg',
    spec: spec(attributes.length),
  };
}

/** On a narrow page a long name takes two lines, cut at a blank. */
const NARROW_LABEL =
  "containerSize()[0] < 560 && length(datum.label) > 20 ? split(replace(datum.label, regexp('^(.{8,18}) '), '$1|'), '|') : datum.label";

function spec(count: number): Chart['spec'] {
  const y = {
    field: 'title',
    type: 'ordinal' as const,
    sort: null,
    title: null,
    axis: { domain: false, ticks: false, labelExpr: NARROW_LABEL, labelLineHeight: 12, labelOffset: { expr: 'containerSize()[0] < 560 ? -4 : 0' }, labelLimit: 240, labelPadding: 8 },
  };
  const x = {
    field: 'from',
    type: 'quantitative' as const,
    title: 'Share of the buildings (%)',
    scale: { domain: [0, 1], nice: false },
    axis: { format: '.0%', values: [0, 0.25, 0.5, 0.75, 1], labelOverlap: true, labelFlush: true, grid: false },
  };
  return {
    width: 'container',
    height: Math.max(count, 1) * 29,
    padding: { left: 4, right: 52, top: 4, bottom: 4 },
    layer: [
      {
        data: { name: 'parts' },
        mark: { type: 'bar', height: 17, stroke: 'var(--mark)', strokeWidth: 0.8 },
        encoding: {
          y,
          x,
          x2: { field: 'to' },
          color: {
            field: 'part',
            type: 'nominal' as const,
            sort: null,
            title: null,
            scale: { domain: [...PARTS], range: ['var(--step-1)', 'var(--step-2)', 'var(--step-3)', 'var(--paper)'] },
            legend: { symbolStrokeColor: 'var(--mark)', symbolType: 'square', symbolStrokeWidth: 1 },
          },
        },
      },
      {
        data: { name: 'labels' },
        mark: { type: 'text', align: 'left', x: { expr: 'width + 8' }, color: 'var(--ink-soft)' },
        encoding: { y, text: { field: 'label', type: 'nominal' as const } },
      },
    ],
  };
}

function sentence(shares: readonly { readonly title: string; readonly share: number }[]): string {
  const gaps = shares.filter(({ share }) => share > 0).sort((a, b) => b.share - a.share);
  const [first, second] = gaps;
  if (first === undefined) return 'Every value used comes from the inventory itself.';
  const name = ({ title, share }: { readonly title: string; readonly share: number }): string => `${title.toLowerCase()} (${formatShare(share)} not given)`;
  return `Of what every building needs, the largest gap is ${name(first)}${second === undefined ? '' : `, then ${name(second)}`}; ${formatCount(shares.length - gaps.length)} of these ${formatCount(shares.length)} attributes ${shares.length - gaps.length === 1 ? 'is' : 'are'} complete.`;
}
