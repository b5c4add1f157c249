import { Dialog as RadixDialog } from 'radix-ui';
import type { ReactNode } from 'react';

/** A dialog, only where undo will not do. Focus goes in and comes back; Escape closes unless `insist`. */
export function Dialog({
  open,
  onClose,
  title,
  lead,
  wide,
  insist,
  children,
}: {
  readonly open: boolean;
  readonly onClose: () => void;
  readonly title: string;
  readonly lead?: ReactNode;
  readonly wide?: boolean;
  /** Must be answered: a click outside does not close it. */
  readonly insist?: boolean;
  readonly children: ReactNode;
}) {
  return (
    <RadixDialog.Root open={open} onOpenChange={(isOpen) => !isOpen && onClose()}>
      <RadixDialog.Portal>
        <RadixDialog.Overlay className="veil" />
        <RadixDialog.Content
          className={wide ? 'dialog wide' : 'dialog'}
          aria-describedby={undefined}
          onInteractOutside={(event) => insist && event.preventDefault()}
          onEscapeKeyDown={(event) => insist && event.preventDefault()}
        >
          <RadixDialog.Title asChild>
            <h2>{title}</h2>
          </RadixDialog.Title>
          {lead !== undefined && <p className="lead">{lead}</p>}
          {children}
        </RadixDialog.Content>
      </RadixDialog.Portal>
    </RadixDialog.Root>
  );
}
