import { Link } from 'react-router-dom';
import { buttonClass } from '../../components/ui/button-class.ts';
import { Page, PageHeading } from '../../components/ui/page.tsx';

export const Component = () => (
  <Page>
    <PageHeading title="There is no page at this address" headline="Check the address, or go back to the bench." />
    <Link to="/" className={buttonClass('outline')}>
      To the bench
    </Link>
  </Page>
);
