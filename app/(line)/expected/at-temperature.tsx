import { Figures, type Figure } from '@/app/_ui/figures';
import { formatNumber, formatReading, formatSignedPercent } from '@/lib/format';
import { coefficientDisagreementPercentPerC } from '@/lib/physics/coefficient-disagreement';
import { isCompensated } from '@/lib/physics/compensated-target';
import { temperatureStepPercent } from '@/lib/physics/resistivity-at-temperature';
import type { ExpectedWafer, Target } from '@/lib/physics/target';
import { targetCoefficientPercentPerC, valueAtTemperature } from '@/lib/physics/value-at-temperature';

/** What a wafer of the target reads at another temperature, by which model, and where one hands over to the other. */
export function AtTemperature(props: {
  target: Target;
  wafer: ExpectedWafer;
  value: number;
  densityPerCm3: number;
  temperatureC: number;
}) {
  const { target, value, temperatureC } = props;
  try {
    const there = valueAtTemperature(target, value, temperatureC, props.wafer);
    return (
      <>
        <p className="phys">
          At {temperatureC} °C: {formatReading(target.quantity, there)},{' '}
          {formatSignedPercent(100 * (there / value - 1), 2)}
        </p>
        <Figures figures={temperatureRows(props)} />
      </>
    );
  } catch (error) {
    if (error instanceof RangeError) return <p className="quiet">{error.message}</p>;
    throw error;
  }
}

function temperatureRows(props: Parameters<typeof AtTemperature>[0]): Figure[] {
  const { target, wafer, value, densityPerCm3 } = props;
  const percent = targetCoefficientPercentPerC(target, wafer);
  const isPlain = target.quantity === 'resistivity' && !isCompensated(target);
  const isOwn = (target.temperatureCoefficientPercentPerC ?? null) !== null;
  const source = isOwn
    ? 'as the target says'
    : isPlain
      ? 'ASTM F84 / SEMI MF84, after Bullis and others (1968), 18 to 28 °C; outside the ratio of the Arora model (1982)'
      : 'd ln value/dT of its own profile or doping: the coefficient of ASTM F84 where it holds, else the Arora model (1982)';
  const rows: Figure[] = [
    { name: 'coefficient at 23 °C', value: `${formatSignedPercent(percent, 3)} per °C`, definition: source },
  ];
  if (!isPlain) return rows;
  const disagreement = coefficientDisagreementPercentPerC(target.dopant, value);
  if (disagreement !== null) {
    rows.push({
      name: 'two sources differ by',
      value: `${formatNumber(Math.abs(disagreement), 2)} % per °C`,
      definition:
        'Bullis and others (1968) against what NBS SP 400-64 (1981) implies: a bound, in the uncertainty away from 23 °C.',
    });
  }
  for (const edgeC of [18, 28] as const) {
    const step = temperatureStepPercent(target.dopant, densityPerCm3, value, edgeC);
    if (step === null) continue;
    rows.push({
      name: `step where the model takes over, ${edgeC} °C`,
      value: formatSignedPercent(step, 2),
      definition: 'The Arora model against the measured coefficient: stated, never blended away.',
    });
  }
  return rows;
}
