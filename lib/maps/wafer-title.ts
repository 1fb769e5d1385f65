/** How a wafer's page calls it: "Wafer 10 of M0015". */
export function waferTitle(facts: { wafer: string; run: string | null; lot: string | null }): string {
  const carrier = facts.run ?? facts.lot;
  return `Wafer ${facts.wafer}${carrier === null ? '' : ` of ${carrier}`}`;
}
