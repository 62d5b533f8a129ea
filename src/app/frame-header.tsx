import { Menu as MenuIcon } from 'lucide-react';
import { useContext, type ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { Breadcrumb, type Crumb } from '../ui/breadcrumb';
import { IconButton } from '../ui/icon-button';
import { Menu, MenuChoice, MenuLink, MenuNote, MenuSeparator } from '../ui/menu';
import { SectionNav, type SectionLink } from '../ui/section-nav';
import { chooseTheme, useThemeChoice } from '../ui/theme';
import { THEME_OPTIONS, ThemeSwitch } from '../ui/theme-switch';
import { AccountItems, AccountMenu } from './account-menu';
import { addressOf } from './addresses';
import { FrameAccountContext, type FrameAccount } from './frame-account';

interface FrameHeaderProps {
  crumbs: readonly Crumb[];
  nav: readonly SectionLink[];
  navLabel: string;
  status: ReactNode;
}

/** One line on a desk, two on a tablet; on a telephone everything but the place and its state goes into a menu. */
export function FrameHeader({ crumbs, nav, navLabel, status }: FrameHeaderProps) {
  const account = useContext(FrameAccountContext);
  return (
    <header className="border-b border-rule px-4 sm:px-7 print:hidden">
      <div className="flex min-h-12 items-center gap-x-4 lg:gap-x-7">
        <Link
          to={addressOf('surveys')}
          className="flex min-h-6 items-center font-semibold tracking-[0.01em] no-underline touch:min-h-11"
        >
          Layerwell
        </Link>
        <Breadcrumb crumbs={crumbs} />
        {nav.length > 0 ? (
          <div className="-mb-px hidden min-w-0 self-stretch lg:flex lg:items-stretch">
            <SectionNav label={navLabel} links={nav} />
          </div>
        ) : null}
        <div className="ml-auto flex shrink-0 items-center gap-1">
          {status ? <div className="mr-2 hidden text-muted md:block">{status}</div> : null}
          <div className="hidden items-center sm:flex">
            <ThemeSwitch />
            {account ? <AccountMenu account={account} /> : null}
          </div>
          <div className="sm:hidden">
            <PhoneMenu crumbs={crumbs} nav={nav} account={account} />
          </div>
        </div>
      </div>
      {nav.length > 0 ? (
        <div className="-mb-px hidden sm:block lg:hidden">
          <SectionNav label={navLabel} links={nav} />
        </div>
      ) : null}
      {status ? <div className="pb-2 text-sm text-muted md:hidden">{status}</div> : null}
    </header>
  );
}

interface PhoneMenuProps {
  crumbs: readonly Crumb[];
  nav: readonly SectionLink[];
  account: FrameAccount | null;
}

function PhoneMenu({ crumbs, nav, account }: PhoneMenuProps) {
  const theme = useThemeChoice();
  const above = crumbs
    .slice(0, -1)
    .filter((crumb): crumb is Crumb & { to: string } => crumb.to !== undefined);
  return (
    <Menu trigger={<IconButton label="Menu" icon={<MenuIcon aria-hidden size={20} />} />}>
      {nav.map((link) => (
        <MenuLink key={link.to} to={link.to}>
          {link.label}
        </MenuLink>
      ))}
      {above.length > 0 ? (
        <>
          {nav.length > 0 ? <MenuSeparator /> : null}
          <MenuNote>Up to</MenuNote>
          {above.map((crumb) => (
            <MenuLink key={crumb.to} to={crumb.to}>
              {crumb.label}
            </MenuLink>
          ))}
        </>
      ) : null}
      <MenuSeparator />
      <MenuChoice label="Theme" value={theme} options={THEME_OPTIONS} onChange={chooseTheme} />
      {account ? (
        <>
          <MenuSeparator />
          <AccountItems account={account} />
        </>
      ) : null}
    </Menu>
  );
}
