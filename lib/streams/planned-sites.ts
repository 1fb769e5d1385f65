import { z } from 'zod';
import { numberTyped, typedChoice, typedNumber, typedText } from '@/lib/typed';
import { crossSites } from '@/lib/wafer/cross-sites';
import { latticeSites } from '@/lib/wafer/lattice-sites';
import { planGeometry } from '@/lib/wafer/plan-geometry';
import { polarSites } from '@/lib/wafer/polar-sites';
import { scanSites } from '@/lib/wafer/scan-sites';
import type { Site } from '@/lib/wafer/site';
import type { SitePlan } from './types';

export const PLAN_SHAPES = ['polar', 'cross', 'scan', 'lattice', 'list'] as const;
export type PlanShape = (typeof PLAN_SHAPES)[number];

const MOST_SITES = 2000;
const positive = (value: number) => value > 0;
const length = (wish: string) => typedNumber({ wish, holds: positive });
const whole = (least: number, most: number) => (value: number) =>
  Number.isInteger(value) && value >= least && value <= most;

const frame = {
  name: typedText({ most: 120, ask: 'Give the plan a name.' }),
  diameterMm: typedNumber({ wish: 'a diameter from 1 to 1000 mm', holds: (v) => v >= 1 && v <= 1000 }),
  edgeExclusionMm: typedNumber({ wish: 'an edge exclusion of 0 mm or more', holds: (v) => v >= 0 }),
  orientation: typedChoice(['notch', 'flat'], 'Choose notch or flat.'),
};
const outerRadiusMm = length('a radius above 0 mm');

/** A new site plan as its form sends it: what is common to all, and what its shape asks for. */
export const newSitePlan = z
  .discriminatedUnion(
    'shape',
    [
      z.object({
        shape: z.literal('polar'),
        ...frame,
        outerRadiusMm,
        rings: typedNumber({ wish: 'a whole number of rings from 0 to 20', holds: whole(0, 20) }),
      }),
      z.object({
        shape: z.literal('cross'),
        ...frame,
        outerRadiusMm,
        arms: z.preprocess(Number, z.union([z.literal(5), z.literal(9)], { error: 'Choose 5 or 9 sites.' })),
      }),
      z.object({
        shape: z.literal('scan'),
        ...frame,
        outerRadiusMm,
        count: typedNumber({
          wish: `a whole number of sites from 25 to ${MOST_SITES}`,
          holds: whole(25, MOST_SITES),
        }),
        angleDegrees: typedNumber({ wish: 'an angle in degrees' }),
      }),
      z.object({
        shape: z.literal('lattice'),
        ...frame,
        outerRadiusMm,
        pitchMm: length('a pitch above 0 mm'),
      }),
      z.object({ shape: z.literal('list'), ...frame, list: z.string().max(200_000) }),
    ],
    { error: 'Choose how the sites lie.' },
  )
  .transform((plan, context): Omit<SitePlan, 'id'> => {
    const { name, diameterMm, edgeExclusionMm, orientation } = plan;
    const fault = (field: string, message: string) => {
      context.addIssue({ code: 'custom', path: [field], message });
      return z.NEVER;
    };
    const field = plan.shape === 'list' ? 'list' : plan.shape === 'lattice' ? 'pitchMm' : 'outerRadiusMm';
    try {
      const sites = shapeSites(plan);
      if (typeof sites === 'string') return fault('list', sites);
      if (sites.length > MOST_SITES)
        return fault(field, `${sites.length} sites; a plan has at most ${MOST_SITES}.`);
      if (2 * edgeExclusionMm >= diameterMm)
        return fault('edgeExclusionMm', 'That leaves nothing of the wafer.');
      const geometry = planGeometry(sites, { diameterMm, edgeExclusionMm });
      if (geometry.excludedSites === sites.length) {
        return fault('edgeExclusionMm', 'Every site lies within the edge exclusion.');
      }
      return { name, diameterMm, edgeExclusionMm, orientation, sites };
    } catch (error) {
      if (error instanceof RangeError) return fault(field, `${capital(error.message)}.`);
      throw error;
    }
  });

type Shaped =
  | { shape: 'polar'; rings: number; outerRadiusMm: number }
  | { shape: 'cross'; arms: 5 | 9; outerRadiusMm: number }
  | { shape: 'scan'; count: number; outerRadiusMm: number; angleDegrees: number }
  | { shape: 'lattice'; pitchMm: number; outerRadiusMm: number }
  | { shape: 'list'; list: string };

function shapeSites(plan: Shaped): Site[] | string {
  if (plan.shape === 'polar') return polarSites(plan.rings, plan.outerRadiusMm);
  if (plan.shape === 'cross') return crossSites(plan.arms, plan.outerRadiusMm);
  if (plan.shape === 'scan') return scanSites(plan.count, plan.outerRadiusMm, plan.angleDegrees);
  if (plan.shape === 'lattice') return latticeSites(plan.pitchMm, plan.outerRadiusMm);
  return listedSites(plan.list);
}

/**
 * Sites from pasted lines "x, y" in millimetres, parted by comma, semicolon, tab or space; a header line of words is
 * passed over. What is wrong comes back as words that name the line.
 */
export function listedSites(text: string): Site[] | string {
  const sites: Site[] = [];
  for (const [index, line] of text.split(/\r?\n/).entries()) {
    if (line.trim() === '') continue;
    const cells = line.trim().split(/\s*[,;\t]\s*|\s+/);
    const [xMm, yMm] = cells.map(numberTyped);
    if (cells.length === 2 && typeof xMm === 'number' && typeof yMm === 'number') sites.push({ xMm, yMm });
    else if (sites.length > 0 || !/^[a-z_]+$/i.test(cells[0] ?? '')) {
      return `Line ${index + 1}, “${line.trim().slice(0, 40)}”, is not two numbers x, y in mm.`;
    }
  }
  return sites.length === 0 ? 'Paste a line "x, y" in mm for each site.' : sites;
}

function capital(words: string): string {
  return words.charAt(0).toUpperCase() + words.slice(1);
}
