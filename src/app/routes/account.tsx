import { useQueryClient, useSuspenseQuery } from '@tanstack/react-query';
import { Page, PageHeading, TwoColumns } from '../../components/ui/page.tsx';
import { HowYouRead, PasswordSheet, SessionsSheet } from '../../features/account/components/account-sheets.tsx';
import { SecondFactorSheet } from '../../features/account/components/second-factor-sheet.tsx';
import { meQuery } from '../../lib/queries/me.ts';
import { closeRealtime } from '../../lib/socket.ts';

export function Component() {
  const queryClient = useQueryClient();
  const { data: me } = useSuspenseQuery(meQuery());
  return (
    <Page>
      <PageHeading title="Account" headline={me.email} />
      <TwoColumns
        main={
          <div className="grid gap-5">
            <HowYouRead me={me} />
            <PasswordSheet email={me.email} />
          </div>
        }
        side={
          <div className="grid gap-5">
            <SecondFactorSheet me={me} />
            <SessionsSheet
              onSignedOut={() => {
                closeRealtime();
                queryClient.clear();
                location.assign('/sign-in');
              }}
            />
          </div>
        }
      />
    </Page>
  );
}
