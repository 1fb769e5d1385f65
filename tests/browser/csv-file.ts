import { expect, type APIRequestContext } from '@playwright/test';
import Papa from 'papaparse';

/** A download read as a CSV file: its header and its rows by the header's words. Fails where it is none. */
export async function csvFile(
  request: APIRequestContext,
  address: string,
): Promise<{ header: string[]; rows: Record<string, string>[] }> {
  const response = await request.get(address);
  expect(response.status(), address).toBe(200);
  expect(response.headers()['content-type'], address).toContain('text/csv');
  expect(response.headers()['content-disposition'], address).toMatch(/^attachment; filename="[\w.-]+\.csv"$/);
  const { data, errors, meta } = Papa.parse<Record<string, string>>(await response.text(), {
    header: true,
    skipEmptyLines: true,
  });
  expect(errors, address).toEqual([]);
  return { header: meta.fields ?? [], rows: data };
}
