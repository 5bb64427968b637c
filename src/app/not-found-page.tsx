import { paths } from '#src/ui/paths.ts';
import { ButtonLink } from '#src/ui/button-link.tsx';
import { Page } from '#src/ui/page.tsx';

export function NotFoundPage() {
  return (
    <Page
      title="Nothing here"
      lead="There is nothing at this address, or nothing that you may see. It may have been deleted, or the address may lack a letter."
    >
      <ButtonLink to={paths.today()}>Go to Today</ButtonLink>
    </Page>
  );
}
