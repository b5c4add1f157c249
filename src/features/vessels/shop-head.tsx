import { useQueryClient } from '@tanstack/react-query';
import type { CSSProperties, ReactNode } from 'react';
import { Link, NavLink, useNavigate } from 'react-router';

import type { Me } from '#shared/api/me.ts';
import { signOut } from '#src/lib/session.ts';
import { Button } from '#src/ui/button.tsx';
import { Initials } from '#src/ui/initials.tsx';
import { Menu, MenuLine, MenuRule } from '#src/ui/menu.tsx';
import { Mark } from '#src/ui/wordmark.tsx';

import { ReaderChoices } from './vessel-menu.tsx';

/** The head of the shop's own pages. */
export function ShopHead({
  me,
  says,
  action,
  onOpenFile,
}: {
  readonly me: Me;
  /** The vessels in a few words. */
  readonly says?: string;
  readonly action?: ReactNode;
  readonly onOpenFile?: () => void;
}) {
  const client = useQueryClient();
  const navigate = useNavigate();
  const shop = me.shops[0];
  return (
    <header className="head shop">
      <Link className="home" to="/">
        <Mark />
        <div>
          <b>{shop?.name ?? 'Ampwright'}</b>
          <span>{shop === undefined ? 'vessels shared with you' : 'shop, with Ampwright'}</span>
        </div>
      </Link>
      <nav className="path" aria-label="Shop" style={{ '--path-width': '140px' } as CSSProperties}>
        <NavLink to="/" end>
          <b>Vessels</b>
          <span>{says ?? ' '}</span>
          <i aria-hidden="true">
            <u style={{ width: '100%' }} />
          </i>
        </NavLink>
      </nav>
      <div className="end">
        <span className="quiet who-name">
          {me.name}
          {shop?.admin === true && ', shop admin'}
        </span>
        <span className="who-name">
          <Initials people={[{ name: me.name, here: true }]} />
        </span>
        <Menu trigger={<Button>Menu</Button>}>
          {onOpenFile !== undefined && (
            <>
              <MenuLine onChoose={onOpenFile}>Open a file as a new vessel</MenuLine>
              <MenuRule />
            </>
          )}
          <ReaderChoices />
          <MenuRule />
          <MenuLine onChoose={() => void signOut(client).then(() => navigate('/sign-in'))}>Sign out {me.name}</MenuLine>
        </Menu>
        {action}
      </div>
    </header>
  );
}

export const CAUTION =
  'A design aid, not a certificate. AC power and battery banks can kill and start fires. Local codes and a qualified person have the last word.';
