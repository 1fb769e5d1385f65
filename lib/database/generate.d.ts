/** Writes the Prisma client where it is missing or older than the schema; returns whether it did. */
export function generatePrismaClient(): boolean;
