import { Desk } from '#src/features/desk/Desk.tsx';
import { Page } from '../layout/Page.tsx';

export function DeskPage() {
  return (
    <Page title="Desk">
      <Desk />
    </Page>
  );
}
