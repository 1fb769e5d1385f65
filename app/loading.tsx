import { Waiting } from './_ui/waiting';

export default function Loading() {
  return <Waiting words="Reading what is recorded…" />;
}
