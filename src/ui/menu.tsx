import { Menu as Primitive } from '@base-ui/react/menu';
import type { ReactElement, ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { classNames } from './class-names';
import { POPUP_CLASS } from './popup-class';

export interface MenuProps {
  /** A Button or IconButton; it gets the menu's behaviour. */
  trigger: ReactElement;
  children: ReactNode;
  align?: 'start' | 'end';
}

const ITEM_CLASS =
  'flex min-h-8 w-full cursor-pointer items-center gap-2.5 px-3 py-1 text-left no-underline outline-none touch:min-h-11 ' +
  'data-highlighted:bg-sunken data-disabled:cursor-not-allowed data-disabled:text-muted';

export function Menu({ trigger, children, align = 'end' }: MenuProps) {
  return (
    <Primitive.Root>
      <Primitive.Trigger render={trigger} />
      <Primitive.Portal>
        <Primitive.Positioner align={align} sideOffset={4} collisionPadding={8} className="z-50">
          <Primitive.Popup className={classNames(POPUP_CLASS, 'min-w-44 py-1')}>{children}</Primitive.Popup>
        </Primitive.Positioner>
      </Primitive.Portal>
    </Primitive.Root>
  );
}

export interface MenuItemProps {
  children: ReactNode;
  onSelect: () => void;
  icon?: ReactNode;
  disabled?: boolean;
  danger?: boolean;
}

export function MenuItem({ children, onSelect, icon, disabled = false, danger = false }: MenuItemProps) {
  return (
    <Primitive.Item
      disabled={disabled}
      onClick={onSelect}
      className={classNames(ITEM_CLASS, danger && 'text-rust')}
    >
      {icon}
      {children}
    </Primitive.Item>
  );
}

export function MenuLink({ to, children, icon }: { to: string; children: ReactNode; icon?: ReactNode }) {
  return (
    <Primitive.LinkItem render={<Link to={to} />} closeOnClick className={ITEM_CLASS}>
      {icon}
      {children}
    </Primitive.LinkItem>
  );
}

export function MenuSeparator() {
  return <Primitive.Separator className="my-1 border-t border-rule" />;
}

/** Words that are no choice, as the name of the person signed in. */
export function MenuNote({ children }: { children: ReactNode }) {
  return <div className="px-3 py-1.5 text-sm text-muted">{children}</div>;
}

export interface MenuChoiceProps<Value extends string> {
  label: string;
  value: Value;
  options: readonly { value: Value; label: string; icon?: ReactNode }[];
  onChange: (value: Value) => void;
}

export function MenuChoice<Value extends string>({
  label,
  value,
  options,
  onChange,
}: MenuChoiceProps<Value>) {
  const choose = (chosen: unknown) => {
    const option = options.find((candidate) => candidate.value === chosen);
    if (option) onChange(option.value);
  };
  return (
    <Primitive.RadioGroup value={value} onValueChange={choose} aria-label={label}>
      <div aria-hidden className="px-3 pt-1.5 pb-0.5 text-sm text-muted">
        {label}
      </div>
      {options.map((option) => (
        <Primitive.RadioItem key={option.value} value={option.value} className={ITEM_CLASS}>
          <span className="w-3 text-water">
            <Primitive.RadioItemIndicator>•</Primitive.RadioItemIndicator>
          </span>
          {option.label}
          {option.icon}
        </Primitive.RadioItem>
      ))}
    </Primitive.RadioGroup>
  );
}
