import { DataTable } from '@/app/_ui/data-table';
import { formatDensityPerCm3, formatNumber, formatPercent, formatResistivity } from '@/lib/format';
import { DOPANTS } from '@/lib/physics/dopant';
import { standardDensity } from '@/lib/physics/standard-density';
import type { UncertaintyBudget } from '@/lib/physics/uncertainty-budget';
import { resistivityAt } from './conversion-plot';
import type { ModelRow } from './model-rows';

/** Every model at the doping in question. */
export function ModelTable({ rows }: { rows: readonly ModelRow[] }) {
  return (
    <DataTable
      caption="The same doping by each model"
      rows={rows}
      rowKey={(row) => row.model}
      columns={[
        { key: 'model', head: 'model', cell: (row) => row.model },
        {
          key: 'value',
          head: 'resistivity',
          align: 'right',
          cell: (row) => formatResistivity(row.resistivityOhmCm),
        },
        { key: 'at', head: 'at', cell: (row) => row.temperature },
        {
          key: 'bound',
          head: 'at most off by',
          align: 'right',
          cell: (row) => (row.boundPercent === null ? '—' : `±${formatNumber(row.boundPercent, 2)} %`),
        },
        { key: 'source', head: 'source', cell: (row) => row.source },
      ]}
    />
  );
}

/** The same density and the same resistivity for every dopant, the way back by both inverses. */
export function DopantTable(props: { densityPerCm3: number; resistivityOhmCm: number; href: string }) {
  const { densityPerCm3, resistivityOhmCm } = props;
  const density = (dopant: (typeof DOPANTS)[number], inverse: 'numeric' | 'direct') => {
    try {
      return formatDensityPerCm3(standardDensity(dopant, resistivityOhmCm, inverse), 4);
    } catch (error) {
      if (error instanceof RangeError) return '—';
      throw error;
    }
  };
  const ohmCm = formatResistivity(resistivityOhmCm);
  return (
    <DataTable
      caption="The same for every dopant, at 23 °C"
      rows={DOPANTS}
      rowKey={(dopant) => dopant}
      download={{ href: props.href, label: 'The curves as CSV' }}
      columns={[
        { key: 'dopant', head: 'dopant', cell: (dopant) => dopant },
        {
          key: 'resistivity',
          head: `reads with ${formatDensityPerCm3(densityPerCm3)}`,
          align: 'right',
          cell: (dopant) => formatResistivity(resistivityAt(dopant, densityPerCm3, 23)),
        },
        {
          key: 'numeric',
          head: `holds at ${ohmCm}, numeric inverse`,
          align: 'right',
          cell: (dopant) => density(dopant, 'numeric'),
        },
        {
          key: 'direct',
          head: 'by the published direct fit',
          align: 'right',
          cell: (dopant) => density(dopant, 'direct'),
        },
      ]}
    />
  );
}

/** The uncertainty of an expected value, part by part. */
export function BudgetTable({ budget, href }: { budget: UncertaintyBudget; href: string }) {
  const percent = (value: number) => formatPercent(value, 2);
  const sums = [
    {
      name: 'standard uncertainty, k = 1',
      value: budget.standardPercent,
      source: 'root of the sum of squares, JCGM 100:2008, 5.1.2',
    },
    { name: 'expanded, k = 2', value: budget.expandedPercent, source: 'JCGM 100:2008, 6.2' },
    {
      name: 'between wafers, k = 1',
      value: budget.betweenWafersPercent,
      source: 'without the parts common to a stream',
    },
  ];
  return (
    <DataTable
      caption="Uncertainty of the expected value, in percent of it"
      captionUnseen
      rows={[
        ...budget.parts.map((part) => ({
          name: part.name,
          bound: part.boundPercent === null ? '—' : `±${formatNumber(part.boundPercent, 3)} %`,
          standard: percent(part.standardPercent),
          common: part.isCommon ? 'yes' : 'no',
          source: part.source,
        })),
        ...sums.map(({ name, value, source }) => ({
          name,
          bound: '',
          standard: percent(value),
          common: '',
          source,
        })),
      ]}
      rowKey={(row) => row.name}
      download={{ href, label: 'The budget as CSV' }}
      columns={[
        { key: 'name', head: 'part', cell: (row) => row.name },
        { key: 'bound', head: 'bound', align: 'right', cell: (row) => row.bound },
        { key: 'standard', head: 'standard', align: 'right', cell: (row) => row.standard },
        { key: 'common', head: 'common to all wafers', cell: (row) => row.common },
        { key: 'source', head: 'from', cell: (row) => row.source },
      ]}
    />
  );
}
