import { Monitor, Moon, Sun } from 'lucide-react';
import { IconButton } from './icon-button';
import { Menu, MenuChoice } from './menu';
import { chooseTheme, useThemeChoice, type ThemeChoice } from './theme';

export const THEME_OPTIONS: readonly { value: ThemeChoice; label: string }[] = [
  { value: 'system', label: 'As on this device' },
  { value: 'light', label: 'Light' },
  { value: 'dark', label: 'Dark' },
];

const ICON = { system: Monitor, light: Sun, dark: Moon } as const;

export function ThemeSwitch() {
  const choice = useThemeChoice();
  const Icon = ICON[choice];
  return (
    <Menu trigger={<IconButton label="Theme" icon={<Icon aria-hidden size={18} />} />}>
      <MenuChoice label="Theme" value={choice} options={THEME_OPTIONS} onChange={chooseTheme} />
    </Menu>
  );
}
