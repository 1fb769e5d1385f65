import type { Doping, MobilityModel } from './conduction-resistivity';

/** What a person should know about a figure from a mobility model, in whole sentences. */
export function mobilityNotes(model: MobilityModel, doping: Doping): string[] {
  const notes = [
    `The ${model} model stands in for the standard conversion; the uncertainty is its spread against it, and every dopant counts as ionized.`,
  ];
  if (doping.donor === 'antimony' && doping.donorsPerCm3 > 0) {
    notes.push(
      model === 'arora'
        ? 'The arora model has one set for every donor; nothing is published on how well it serves antimony.'
        : `Antimony has no set of its own in the ${model} model: that of phosphorus stands in, with an accuracy not established.`,
    );
  }
  if (doping.donorsPerCm3 > 0 && doping.acceptorsPerCm3 > 0) {
    notes.push('Compensated: mobility at the total of both dopants, carriers from both.');
  }
  return notes;
}
