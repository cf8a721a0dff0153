import { LinkButton } from '../ui/button.tsx';
import { Page } from '../ui/page.tsx';

export function NotFoundPage() {
  return (
    <Page
      title="There is nothing at this address"
      lead={<p>The address may be mistyped, or what it named was moved or is not for your account. Begin again from the first page.</p>}
      actions={<LinkButton to="/">To the first page</LinkButton>}
    />
  );
}
