import type { ClientBase, Pool } from 'pg';
import type { Actor } from './actor';
import { audited } from './audited';
import { refuse } from './refusal';
import type { AccessResult } from './types';

/** Whether limits may be approved only by someone other than who drew them up. */
export async function isFourEyes(_actor: Actor, client: ClientBase | Pool): Promise<boolean> {
  const { rows } = await client.query<{ value: boolean }>(
    `SELECT value = 'true' AS value FROM plant_setting WHERE key = 'four-eyes'`,
  );
  return rows[0]?.value ?? false;
}

/** Asks for four eyes from now on, or no longer. */
export async function setFourEyes(actor: Actor, on: boolean): Promise<AccessResult> {
  const refusal = refuse(actor, 'change-settings');
  if (refusal) return refusal;
  return audited(actor, async (client, tell) => {
    const before = await isFourEyes(actor, client);
    if (before === on) return { ok: false, reason: 'It is so already.' };
    await client.query(
      `INSERT INTO plant_setting (key, value) VALUES ('four-eyes', $1)
       ON CONFLICT (key) DO UPDATE SET value = excluded.value`,
      [JSON.stringify(on)],
    );
    const subject = { kind: 'setting', id: 'four-eyes' } as const;
    tell({ action: 'changed a setting', subject, before: { on: before }, after: { on } });
    return { ok: true, value: undefined };
  });
}
