import { DropdownMenu } from 'radix-ui';
import type { ReactNode } from 'react';
import { joinClasses } from './join-classes.ts';

const ITEM =
  'flex min-h-thumb cursor-pointer items-center gap-3 px-3 py-2 no-underline outline-none select-none data-[highlighted]:bg-bone data-[disabled]:cursor-not-allowed data-[disabled]:text-lead-grey';

export interface MenuProps {
  /** The element that opens it: a `Button`, given its own name. */
  trigger: ReactNode;
  align?: 'start' | 'end';
  /** `MenuItem`, `MenuChoices`, `MenuSeparator`. */
  children: ReactNode;
}

/** Acts that are one step away. Not modal: the page stays readable behind it, and no style sheet is written into it. */
export function Menu({ trigger, align = 'end', children }: MenuProps) {
  return (
    <DropdownMenu.Root modal={false}>
      <DropdownMenu.Trigger asChild>{trigger}</DropdownMenu.Trigger>
      <DropdownMenu.Portal>
        <DropdownMenu.Content
          align={align}
          sideOffset={6}
          collisionPadding={8}
          className="z-50 min-w-52 rounded border border-edge bg-vellum py-1"
        >
          {children}
        </DropdownMenu.Content>
      </DropdownMenu.Portal>
    </DropdownMenu.Root>
  );
}

export interface MenuItemProps {
  onSelect?: () => void;
  disabled?: boolean;
  danger?: boolean;
  /** The child is a link that takes the item's place. */
  asChild?: boolean;
  children: ReactNode;
}

export function MenuItem({ onSelect, disabled, danger = false, asChild, children }: MenuItemProps) {
  return (
    <DropdownMenu.Item
      asChild={asChild}
      disabled={disabled}
      onSelect={onSelect}
      className={joinClasses(ITEM, danger && 'text-oxide')}
    >
      {children}
    </DropdownMenu.Item>
  );
}

export interface MenuChoicesProps<Value extends string> {
  label: string;
  value: Value;
  options: readonly { value: Value; label: ReactNode }[];
  onChoose: (value: Value) => void;
}

/** One of a few, with the present one marked, as the theme of the page. */
export function MenuChoices<Value extends string>({ label, value, options, onChoose }: MenuChoicesProps<Value>) {
  return (
    <DropdownMenu.RadioGroup value={value} onValueChange={(chosen) => onChoose(chosen as Value)} aria-label={label}>
      <DropdownMenu.Label className="px-3 pt-2 pb-1 text-lead-grey stamped">{label}</DropdownMenu.Label>
      {options.map((option) => (
        <DropdownMenu.RadioItem key={option.value} value={option.value} className={ITEM}>
          <span aria-hidden className="flex size-3.5 items-center justify-center rounded-full border border-edge">
            <DropdownMenu.ItemIndicator className="size-2 rounded-full bg-brass" />
          </span>
          {option.label}
        </DropdownMenu.RadioItem>
      ))}
    </DropdownMenu.RadioGroup>
  );
}

export function MenuSeparator() {
  return <DropdownMenu.Separator className="my-1 h-px bg-hairline" />;
}
