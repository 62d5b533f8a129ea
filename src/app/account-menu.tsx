import { UserRound } from 'lucide-react';
import { IconButton } from '../ui/icon-button';
import { Menu, MenuItem, MenuLink, MenuNote, MenuSeparator } from '../ui/menu';
import { addressOf } from './addresses';
import type { FrameAccount } from './frame-account';

export function AccountMenu({ account }: { account: FrameAccount }) {
  return (
    <Menu
      trigger={
        <IconButton label={`Account of ${account.displayName}`} icon={<UserRound aria-hidden size={18} />} />
      }
    >
      <AccountItems account={account} />
    </Menu>
  );
}

export function AccountItems({ account }: { account: FrameAccount }) {
  return (
    <>
      <MenuNote>
        <span className="block font-semibold text-ink">{account.displayName}</span>
        {account.email}
      </MenuNote>
      <MenuSeparator />
      <MenuLink to={addressOf('settings')}>Settings</MenuLink>
      {account.isAdmin ? <MenuLink to={addressOf('admin')}>Administration</MenuLink> : null}
      <MenuItem onSelect={account.onSignOut}>Sign out</MenuItem>
    </>
  );
}
