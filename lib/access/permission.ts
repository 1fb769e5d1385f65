/** The roles a person may have, from the least to the most. A person may have several. */
export const ROLES = ['viewer', 'shift-lead', 'process-owner', 'manager', 'administrator'] as const;

export type Role = (typeof ROLES)[number];

export const ROLE_WORDS: Record<Role, string> = {
  viewer: 'viewer',
  'shift-lead': 'shift lead',
  'process-owner': 'process owner',
  manager: 'manager',
  administrator: 'administrator',
};

interface Rule {
  /** What it allows, as the administrator reads it. */
  words: string;
  roles: readonly Role[];
  /** How far a role goes that was granted for chosen streams: on those only, everywhere, or not at all. */
  ofChosen: 'those' | 'all' | 'none';
  /** What a token must be made for to have it; null where no machine may. */
  token: 'read' | 'intake' | null;
}

/**
 * Who may do what: the one table, asked by every page, action, route and command through `may`, and shown to the
 * administrator as it stands here.
 */
export const PERMISSIONS = {
  'see-line': {
    words: 'See boards, charts, wafers and cases',
    roles: ROLES,
    ofChosen: 'all',
    token: 'read',
  },
  'record-maps': line('Record wafer maps', ['shift-lead', 'process-owner'], 'intake'),
  'exclude-reading': line('Take a reading out of the figures, or put it back', [
    'shift-lead',
    'process-owner',
  ]),
  'acknowledge-case': line('Acknowledge a case', ['shift-lead', 'process-owner']),
  'comment-case': line('Write into the log of a case', ['shift-lead', 'process-owner']),
  'investigate-case': line('Take a case under investigation', ['process-owner']),
  'close-case': line('Close a case with its cause', ['process-owner']),
  'record-event': line('Enter an adjustment or maintenance', ['shift-lead', 'process-owner']),
  'draft-limits': line('Draw up limits from a baseline, or set a draft aside', ['process-owner']),
  'approve-limits': line('Approve limits', ['process-owner']),
  'revise-target': line('Revise a target or its calibration', ['process-owner']),
  'revise-specification': line('Revise a specification', ['process-owner']),
  'change-rules': line('Change how a stream is screened and judged', ['process-owner']),
  'retire-stream': line('Retire a stream, or take it up again', ['process-owner']),
  'create-stream': plant('Create streams and site plans', ['process-owner']),
  'read-reports': {
    words: 'Read weekly reports',
    roles: ['manager', 'process-owner'],
    ofChosen: 'all',
    token: null,
  },
  'write-weekly-note': plant('Write the note of a week', ['manager']),
  'read-audit': plant('Read the audit trail', ['manager', 'administrator']),
  'manage-people': plant('Add people, give roles, end sessions', ['administrator']),
  'manage-tokens': plant('Make and revoke tokens', ['administrator']),
  'change-settings': plant('Change what holds for the whole plant, such as four eyes', ['administrator']),
  'manage-gauges': plant('Keep gauges and check standards', ['administrator']),
} as const satisfies Record<string, Rule>;

export type Permission = keyof typeof PERMISSIONS;

function line(words: string, roles: readonly Role[], token: Rule['token'] = null): Rule {
  return { words, roles, ofChosen: 'those', token };
}

function plant(words: string, roles: readonly Role[]): Rule {
  return { words, roles, ofChosen: 'none', token: null };
}
