import type { Metadata } from 'next';
import { SectionHead } from '@/app/_ui/section-head';
import { signedIn } from '@/app/page-actor';
import { findFourEyes } from '@/lib/access/data';
import { AccessHead } from '../access-head';
import { FourEyesForm } from './four-eyes-form';
import { PermissionTable } from './permission-table';

export const metadata: Metadata = { title: 'Permissions' };

export default async function PermissionsPage() {
  const actor = await signedIn('change-settings');
  const fourEyes = await findFourEyes(actor);
  return (
    <>
      <AccessHead
        place="Permissions"
        answer={
          fourEyes
            ? 'Five roles, and limits need four eyes'
            : 'Five roles; whoever draws limits up may approve them'
        }
        sub="The table that every page, form and address of this server asks. It is part of the program: roles are given to people, permissions are not. Weekly reports and notes, and gauges, have no pages yet: their lines say who will have them."
      />
      <PermissionTable />
      <SectionHead id="four-eyes">Four eyes over limits</SectionHead>
      <FourEyesForm on={fourEyes} />
    </>
  );
}
