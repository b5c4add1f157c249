import { DropdownMenu } from 'radix-ui';
import type { ReactNode } from 'react';

/** A menu under what opens it. Lines, one of several, rules between. */
export function Menu({
  trigger,
  align = 'end',
  children,
}: {
  /** One button; gets the keyboard and the expanded state. */
  readonly trigger: ReactNode;
  readonly align?: 'start' | 'end';
  readonly children: ReactNode;
}) {
  return (
    <DropdownMenu.Root modal={false}>
      <DropdownMenu.Trigger asChild>{trigger}</DropdownMenu.Trigger>
      <DropdownMenu.Portal>
        <DropdownMenu.Content className="menu" align={align} sideOffset={4} collisionPadding={8}>
          {children}
        </DropdownMenu.Content>
      </DropdownMenu.Portal>
    </DropdownMenu.Root>
  );
}

export function MenuLine({
  onChoose,
  kbd,
  off,
  children,
}: {
  readonly onChoose: () => void;
  readonly kbd?: string;
  readonly off?: boolean;
  readonly children: ReactNode;
}) {
  return (
    <DropdownMenu.Item className="menu-line" disabled={off} onSelect={onChoose}>
      {children}
      {kbd !== undefined && (
        <kbd className="kbd" aria-hidden="true">
          {kbd}
        </kbd>
      )}
    </DropdownMenu.Item>
  );
}

/** A line that is a link: pass one anchor or router link. */
export function MenuLink({ children }: { readonly children: ReactNode }) {
  return (
    <DropdownMenu.Item className="menu-line" asChild>
      {children}
    </DropdownMenu.Item>
  );
}

/** One of several; the chosen one has a tick. */
export function MenuChoice({
  title,
  value,
  choices,
  onChoose,
}: {
  readonly title: string;
  readonly value: string;
  readonly choices: readonly { readonly value: string; readonly title: string }[];
  readonly onChoose: (value: string) => void;
}) {
  return (
    <DropdownMenu.Group aria-label={title}>
      <DropdownMenu.Label className="menu-title">{title}</DropdownMenu.Label>
      <DropdownMenu.RadioGroup value={value} onValueChange={onChoose}>
        {choices.map((choice) => (
          <DropdownMenu.RadioItem key={choice.value} value={choice.value} className="menu-line">
            {choice.title}
          </DropdownMenu.RadioItem>
        ))}
      </DropdownMenu.RadioGroup>
    </DropdownMenu.Group>
  );
}

export function MenuRule() {
  return <DropdownMenu.Separator className="menu-rule" />;
}
