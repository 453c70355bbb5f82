import { useQueryClient, useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link, useNavigate } from 'react-router-dom';
import { signOut } from '../../shared/contracts/accounts.ts';
import { Button } from '../components/ui/button.tsx';
import { Dialog } from '../components/ui/dialog.tsx';
import { Menu, MenuChoices, MenuItem, MenuSeparator } from '../components/ui/menu.tsx';
import { stripLinkClass } from '../components/ui/top-strip.tsx';
import { useAct } from '../hooks/use-act.ts';
import { meQuery } from '../lib/queries/me.ts';
import { closeRealtime } from '../lib/socket.ts';
import { chooseTheme, chosenTheme, THEMES } from '../lib/theme.ts';

/** Account, shops, theme and the way out. */
export function PersonMenu() {
  const { data: me } = useSuspenseQuery(meQuery());
  const navigate = useNavigate();
  const queryClient = useQueryClient();
  const [theme, setTheme] = useState(chosenTheme());
  const leave = useAct(signOut, {
    onDone: () => {
      closeRealtime();
      queryClient.clear();
      void navigate('/sign-in');
    },
  });
  return (
    <>
      <Menu
        trigger={
          <button type="button" className={stripLinkClass(false)}>
            {me.displayName}
          </button>
        }
      >
        <MenuItem asChild>
          <Link to="/account">Account</Link>
        </MenuItem>
        {me.shops.map((shop) => (
          <MenuItem key={shop.shopId} asChild>
            <Link to={`/shops/${shop.shopId}`}>{shop.name}</Link>
          </MenuItem>
        ))}
        {me.isSteward && (
          <MenuItem asChild>
            <Link to="/shops">All shops</Link>
          </MenuItem>
        )}
        <MenuItem asChild>
          <Link to="/api-reference">API reference</Link>
        </MenuItem>
        <MenuSeparator />
        <MenuChoices
          label="Light"
          value={theme}
          options={THEMES}
          onChoose={(next) => {
            chooseTheme(next);
            setTheme(next);
          }}
        />
        <MenuSeparator />
        <MenuItem onSelect={() => leave.run({})}>Sign out</MenuItem>
      </Menu>
      <Dialog
        open={leave.problem !== null}
        onOpenChange={leave.forget}
        title="You are still signed in"
        description="Ferrule could not be told that you leave. Try again when the connection is back; until then this device stays signed in."
        actions={
          <Button busy={leave.pending} onClick={() => leave.run({})}>
            Sign out
          </Button>
        }
      />
    </>
  );
}
