import type { Metadata } from 'next';
import { PageHead } from '@/app/_ui/page-head';
import { signedIn } from '@/app/page-actor';

export const metadata: Metadata = { title: 'Methods' };

/** Each method in use, and where it was published. */
const METHODS = [
  ['Doping and resistivity at 23 °C', 'ASTM F723 / SEMI MF723, after NBS Special Publication 400-64 (1981)'],
  [
    'Temperature coefficient, 18 to 28 °C',
    'ASTM F84 / SEMI MF84, after Bullis et al., Solid-State Electron. 11, 639 (1968)',
  ],
  [
    'Away from 18 to 28 °C, and two dopants in one silicon',
    'Mobility of Arora et al., IEEE T-ED 29, 292 (1982), and Masetti et al., IEEE T-ED 30, 764 (1983); carriers by Misiakos and Tsamakis, J. Appl. Phys. 74, 3293 (1993)',
  ],
  ['Along a crystal', 'Scheil’s law, with the segregation coefficients of the trade'],
  ['Implanted and diffused layers', 'J. C. Irvin, Bell Syst. Tech. J. 41, 387 (1962), down to the junction'],
  ['Limits of the level', 'Moving range of the subgroups; NIST/SEMATECH e-Handbook, section 6.3.2.2'],
  ['Rules', 'Western Electric, Statistical Quality Control Handbook (1956)'],
  ['How often rules signal by chance', 'Champ and Woodall, Technometrics 29, 393 (1987)'],
  ['Tolerance kept apart from uncertainty', 'JCGM 106:2012; standard uncertainties by JCGM 100:2008'],
  ['Wafer sizes and thicknesses', 'SEMI M1'],
] as const;

export default async function MethodsPage() {
  await signedIn('see-line');
  return (
    <>
      <PageHead
        answer="The published methods behind the figures"
        sub="Each figure’s definition stands beside it. What they expect of a target stands on the page Expected. The screening of readings and the joining of signals to cases are our own."
        back={{ href: '/', label: 'Board' }}
      />
      <dl style={{ margin: 0 }}>
        {METHODS.map(([name, source]) => (
          <div key={name} style={{ padding: '8px 0', borderBottom: '1px solid var(--rule)' }}>
            <dt className="quiet small">{name}</dt>
            <dd style={{ margin: 0 }}>{source}</dd>
          </div>
        ))}
      </dl>
    </>
  );
}
