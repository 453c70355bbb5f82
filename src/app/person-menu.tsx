import { useQueryClient, useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link, useNavigate } from 'react-router-dom';
import { signOut } from '../../shared/contracts/accounts.ts';
import { Button } from '../components/ui/button.tsx';
import { Disclosure } from '../components/ui/disclosure.tsx';
import { Notice } from '../components/ui/notice.tsx';
import { RadioGroup } from '../components/ui/radio-group.tsx';
import { stripLinkClass } from '../components/ui/top-strip.tsx';
import { useAct } from '../hooks/use-act.ts';
import { meQuery } from '../lib/queries/me.ts';
import { closeRealtime } from '../lib/socket.ts';
import { chooseTheme, chosenTheme, THEMES, type Theme } from '../lib/theme.ts';

const PLACE = 'flex min-h-thumb items-center rounded px-2 no-underline hover:bg-bone';

/** Account, shops, theme and the way out. */
export function PersonMenu() {
  const { data: me } = useSuspenseQuery(meQuery());
  const navigate = useNavigate();
  const queryClient = useQueryClient();
  const [theme, setTheme] = useState<Theme>(chosenTheme());
  const leave = useAct(signOut, {
    onDone: () => {
      closeRealtime();
      queryClient.clear();
      void navigate('/sign-in');
    },
  });
  return (
    <Disclosure label={me.displayName} buttonClassName={stripLinkClass(false)}>
      <ul className="border-b border-hairline pb-2">
        <li>
          <Link to="/account" className={PLACE}>
            Account
          </Link>
        </li>
        {me.shops.map((shop) => (
          <li key={shop.shopId}>
            <Link to={`/shops/${shop.shopId}`} className={PLACE}>
              {shop.name}
            </Link>
          </li>
        ))}
        {me.isSteward && (
          <li>
            <Link to="/shops" className={PLACE}>
              All shops
            </Link>
          </li>
        )}
        <li>
          <Link to="/api-reference" className={PLACE}>
            API reference
          </Link>
        </li>
      </ul>
      <div className="border-b border-hairline px-2 py-3">
        <RadioGroup
          legend="Look of the page"
          name="theme"
          options={THEMES}
          value={theme}
          onValueChange={(next) => {
            chooseTheme(next);
            setTheme(next);
          }}
        />
      </div>
      <div className="grid gap-2 px-2 pt-3">
        <Button variant="outline" busy={leave.pending} onClick={() => leave.run({})}>
          Sign out
        </Button>
        {leave.problem && (
          <Notice kind="alert" title="You are still signed in">
            Ferrule could not be told that you leave. Try again when the connection is back.
          </Notice>
        )}
      </div>
    </Disclosure>
  );
}
