import tseslint from 'typescript-eslint';

const pureRooms = ['stats', 'physics', 'probe', 'wafer', 'control'];
/** One above another: a room may use those before it in this list. */
const serviceRooms = ['access', 'excursions', 'streams', 'maps', 'limits', 'reviews'];
const pure = pureRooms.join('|');
const service = serviceRooms.join('|');

/** The import law: one pattern, one message that says where the code belongs. */
const law = {
  statistics: {
    regex: '^simple-statistics$',
    message: 'Only lib/stats knows simple-statistics: add or use a function of lib/stats.',
  },
  roomByName: {
    regex: '^\\.\\./',
    message: 'Write @/lib/room/file across rooms, ./file within one.',
  },
  appFromLib: {
    regex: '^@/app/',
    message: 'lib never imports app: what both need belongs into a room of lib.',
  },
  pureOnly: {
    regex: `^(@/lib/(?!(${pure})/)|@/(app|seed|tests)/)`,
    message: 'A pure room imports pure rooms only: let the caller, a service room, pass the value in.',
  },
  pureOfMachine: {
    regex: '^(node:|fs$|path$|crypto$|react|next|pg|@prisma/|zod$)',
    message: 'A pure room is arithmetic: no react, next, database or machine. Read outside, pass values in.',
  },
  tables: {
    regex: '^(pg|pg-copy-streams|@prisma/.*|@/lib/database/(client|generated/.*))$',
    message: 'Pages and drawing never touch tables: read and write in a service room, which takes an Actor.',
  },
  request: {
    regex: '^next/(headers|server)$',
    message: 'Only lib/access reads cookies and headers: take an Actor as first argument.',
  },
  audited: {
    regex: '^@/lib/database/transaction$',
    message: 'What a room writes goes into the audit trail with it: use audited of lib/access/audited.',
  },
  drawing: {
    regex: `^@/(seed|tests|lib/(?!(${pure})/|format$|(${service})/(types|schema)$))`,
    message: 'Drawing takes plain props: pure rooms, types.ts and schema.ts of a room, and lib/format only.',
  },
};

/** Service rooms stand one above another, so that their imports never run in a circle. */
function roomsAbove(name) {
  const above = serviceRooms.slice(serviceRooms.indexOf(name) + 1);
  if (above.length === 0) return [];
  const message = `Service rooms stand one above another (${serviceRooms.join(', ')}): a room uses those before it. Move the code down, or pass it in.`;
  return [{ regex: `^@/lib/(${above.join('|')})/`, message }];
}

const habits = [
  { selector: 'TSEnumDeclaration', message: 'Write a union of words instead of an enum.' },
  { selector: 'ExportAllDeclaration', message: 'No barrels: import from the file that holds the thing.' },
];

const namedExports = { selector: 'ExportDefaultDeclaration', message: 'Export by name.' };

const stillness = [
  {
    selector: 'MemberExpression[object.name="Math"][property.name="random"]',
    message: 'A pure room draws no random numbers: take a seeded source as argument.',
  },
  {
    selector:
      'MemberExpression[object.name="Date"][property.name="now"], NewExpression[callee.name="Date"][arguments.length=0]',
    message: 'A pure room has no clock: take the moment as argument.',
  },
  {
    selector: 'Identifier[name="process"]',
    message: 'A pure room has no environment: take the value as argument.',
  },
];

function room(files, patterns, syntax = [], ignores = []) {
  return {
    files,
    ignores,
    rules: {
      '@typescript-eslint/no-restricted-imports': ['error', { patterns }],
      'no-restricted-syntax': ['error', ...habits, ...syntax],
    },
  };
}

const code = '**/*.{ts,tsx}';

export default tseslint.config(
  {
    ignores: [
      'node_modules/',
      '.next/',
      '.evenohm/',
      '.results/',
      'lib/database/generated/',
      'next-env.d.ts',
    ],
  },
  ...tseslint.configs.recommended,
  {
    linterOptions: { noInlineConfig: true },
    rules: {
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_' }],
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      'no-var': 'error',
      'prefer-const': 'error',
      'max-lines': ['error', { max: 300 }],
    },
  },
  room([`app/${code}`], [law.statistics, law.tables]),
  room([`app/_{charts,ui}/${code}`], [law.statistics, law.tables, law.drawing]),
  room([`{seed,tests}/${code}`], [law.statistics]),
  room([`tests/unit/stats/${code}`, 'tests/reference/stats.test.ts'], []),
  ...pureRooms.map((name) =>
    room(
      [`lib/${name}/${code}`],
      [law.roomByName, law.pureOnly, law.pureOfMachine, ...(name === 'stats' ? [] : [law.statistics])],
      [namedExports, ...stillness],
    ),
  ),
  ...serviceRooms.map((name) =>
    room(
      [`lib/${name}/${code}`],
      [
        law.roomByName,
        law.appFromLib,
        law.statistics,
        ...roomsAbove(name),
        ...(name === 'access' ? [] : [law.request, law.audited]),
      ],
      [namedExports],
    ),
  ),
  room(
    ['lib/database/**/*.ts', 'lib/*.ts'],
    [law.roomByName, law.appFromLib, law.statistics],
    [namedExports],
  ),
  room(['lib/command/**/*.ts'], [law.appFromLib, law.statistics, law.request], [namedExports]),
);
