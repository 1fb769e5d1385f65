import { cache } from 'react';
import type { Permission } from '@/lib/access/permission';

/** What the page of a request was refused for, so that the page which stands in for it can say so. */
export const refusedPermission = cache((): { permission: Permission | null } => ({ permission: null }));
