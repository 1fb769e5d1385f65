interface ElementType {
  oid: number;
  bytes: number;
  put: (view: DataView, at: number, value: unknown) => void;
}

const MICROSECONDS_AT_2000 = Date.UTC(2000, 0, 1) * 1000;

/** What travels as bytes: types whose text is dear to write and to read. A time comes as `Date` or ISO 8601 text. */
const ELEMENT_TYPES: Readonly<Record<string, ElementType>> = {
  float8: { oid: 701, bytes: 8, put: (view, at, value) => view.setFloat64(at, Number(value)) },
  integer: { oid: 23, bytes: 4, put: (view, at, value) => view.setInt32(at, Number(value)) },
  timestamptz: {
    oid: 1184,
    bytes: 8,
    put: (view, at, value) => {
      const milliseconds = value instanceof Date ? value.getTime() : Date.parse(String(value));
      view.setBigInt64(at, BigInt(milliseconds * 1000 - MICROSECONDS_AT_2000));
    },
  },
};

const HEADER_BYTES = 20;

/**
 * Values as one array in the binary form that PostgreSQL reads (`array_recv` in its `arrayfuncs.c`: dimensions, flag of
 * nulls, type, length, lower bound, then each element with its length, −1 for null; a time in microseconds since 2000).
 * Null where elements of that type travel as text.
 *
 * @example binaryArray('integer', [7, null]) // 32 bytes
 */
export function binaryArray(type: string, values: readonly unknown[]): Buffer | null {
  const element = ELEMENT_TYPES[type];
  if (element === undefined) return null;
  const { oid, bytes, put } = element;
  const buffer = Buffer.allocUnsafe(HEADER_BYTES + values.length * (4 + bytes));
  const view = new DataView(buffer.buffer, buffer.byteOffset, buffer.length);
  let end = HEADER_BYTES;
  let nulls = 0;
  for (const value of values) {
    const isNull = value === null || value === undefined;
    view.setInt32(end, isNull ? -1 : bytes);
    end += 4;
    if (isNull) nulls = 1;
    else {
      put(view, end, value);
      end += bytes;
    }
  }
  const isEmpty = values.length === 0;
  [isEmpty ? 0 : 1, nulls, oid, values.length, 1].forEach((word, i) => view.setInt32(4 * i, word));
  return buffer.subarray(0, isEmpty ? 12 : end);
}
