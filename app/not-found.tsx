import { Page } from './_components/ui/page';
import { PageTitle } from './_components/ui/page-title';
import { Section } from './_components/ui/section';
import { TextLink } from './_components/ui/text-link';
import { TopBar } from './_components/ui/top-bar';

export default function NotFound() {
  return (
    <Page bar={<TopBar />}>
      <Section>
        <PageTitle>Not found</PageTitle>
        <p className="mt-3">Nothing stands under this address, or it belongs to an organisation you are not a member of.</p>
        <p className="mt-3"><TextLink href="/">Go to the front page</TextLink></p>
      </Section>
    </Page>
  );
}
