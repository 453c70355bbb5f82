import { useQueryClient, useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link, useNavigate } from 'react-router-dom';
import { signOut } from '../../shared/contracts/accounts.ts';
import { Menu, MenuChoices, MenuItem, MenuSeparator } from '../components/ui/menu.tsx';
import { stripLinkClass } from '../components/ui/top-strip.tsx';
import { api } from '../lib/api.ts';
import { meQuery } from '../lib/queries/me.ts';
import { closeRealtime } from '../lib/socket.ts';
import { chooseTheme, chosenTheme, THEMES } from '../lib/theme.ts';

/** Account, shops, theme and the way out. */
export function PersonMenu() {
  const { data: me } = useSuspenseQuery(meQuery());
  const navigate = useNavigate();
  const queryClient = useQueryClient();
  const [theme, setTheme] = useState(chosenTheme());
  const leave = async (): Promise<void> => {
    await api(signOut, {});
    closeRealtime();
    queryClient.clear();
    await navigate('/sign-in');
  };
  return (
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
      <MenuItem onSelect={() => void leave()}>Sign out</MenuItem>
    </Menu>
  );
}
