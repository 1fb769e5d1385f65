import type { CheckedFile } from '@/lib/maps/checked-file';

const maps = (count: number) => `${count} wafer ${count === 1 ? 'map' : 'maps'}`;

/** What a check found, in one sentence, and what follows from it in another. */
export function checkSentence(name: string, check: CheckedFile): { answer: string; sub: string } {
  const { measurements, faulty, repeated, fresh } = check;
  const onRecord = repeated === 0 ? '' : ` ${repeated} ${repeated === 1 ? 'is' : 'are'} on record already.`;
  if (check.spoilt)
    return { answer: `${name} cannot be read as a wafer-map file`, sub: 'Nothing is recorded of it.' };
  if (faulty.size === measurements) {
    return {
      answer:
        measurements === 1
          ? `The map in ${name} cannot be recorded`
          : `None of the ${maps(measurements)} in ${name} can be recorded`,
      sub: 'The problems are listed below. Say what the file leaves out, or mend the file and send it again.',
    };
  }
  if (faulty.size > 0) {
    return {
      answer: `${faulty.size} of ${maps(measurements)} in ${name} cannot be recorded`,
      sub: `${fresh > 0 ? `${fresh} can.` : 'None of the others is new.'}${onRecord} A map is recorded whole or not at all.`,
    };
  }
  if (fresh === 0) {
    return {
      answer: `${name} is on record already`,
      sub: `The same ${maps(measurements)}, with the same readings: recording it again changes nothing.`,
    };
  }
  return {
    answer: `${maps(fresh)} in ${name} can be recorded`,
    sub: `No problem was found.${onRecord}`,
  };
}
