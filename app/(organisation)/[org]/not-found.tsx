import { NothingHere } from '@/app/_components/organisation/nothing-here';

export default function OrganisationNotFound() {
  return <NothingHere />;
}
