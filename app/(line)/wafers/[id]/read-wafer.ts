import { cache } from 'react';
import { signedIn } from '@/app/page-actor';
import { findWafer } from '@/lib/maps/data';

/** The wafer of a request, read once for its title and its page. */
export const readWafer = cache(async (id: string) => findWafer(await signedIn('see-line'), id));
