import { cache } from 'react';
import { localActor } from '@/lib/access/local-actor';
import { findWafer } from '@/lib/maps/data';

/** The wafer of a request, read once for its title and its page. */
export const readWafer = cache((id: string) => findWafer(localActor(), id));
