import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';

import { listMail } from '#shared/api/mailbox.ts';
import { call } from '#src/lib/call.ts';
import { serverFactsQuery } from '#src/lib/session.ts';
import { EmptyState } from '#src/ui/empty-state.tsx';
import { When } from '#src/ui/when.tsx';

/** What a local instance would have sent by e-mail: newest first, with its links to follow. */
export function Mailbox() {
  const facts = useQuery(serverFactsQuery);
  const mail = useQuery({
    queryKey: ['mailbox'],
    queryFn: ({ signal }) => call(listMail, { signal }),
    enabled: facts.data?.mailbox === true,
    refetchInterval: 2_000,
  });
  const [openId, setOpenId] = useState<string | null>(null);

  if (facts.data?.mailbox === false) {
    return (
      <EmptyState title="This server sends real mail">
        It has no mailbox to look into; the mail is where you read yours.
      </EmptyState>
    );
  }
  if (mail.error !== null && mail.data === undefined) {
    return <EmptyState title="The mailbox cannot be opened">{mail.error.message}</EmptyState>;
  }
  const rows = mail.data?.rows ?? [];
  if (mail.data !== undefined && rows.length === 0) {
    return (
      <EmptyState title="No mail yet">
        Sign up, invite someone or ask for a new password: the mail of it comes here within seconds.
      </EmptyState>
    );
  }
  const shownId = openId ?? rows[0]?.mailId;
  return (
    <ol className="mails">
      {rows.map((row) => (
        <li key={row.mailId}>
          <button
            type="button"
            aria-expanded={row.mailId === shownId}
            onClick={() => setOpenId(row.mailId === shownId ? '' : row.mailId)}
          >
            <b>{row.subject}</b>
            <span>to {row.to}</span>
            <span className="quiet">
              <When at={row.at} />
            </span>
          </button>
          {row.mailId === shownId && (
            <div className="mail-text">
              <Text text={row.text} links={row.links} />
            </div>
          )}
        </li>
      ))}
    </ol>
  );
}

/** The text as it was sent; only the links that the server found in it can be followed. */
function Text({ text, links }: { readonly text: string; readonly links: readonly string[] }) {
  const parts = links.reduce<readonly string[]>(
    (pieces, link) => pieces.flatMap((piece) => (links.includes(piece) ? [piece] : cut(piece, link))),
    [text],
  );
  return (
    <p>
      {parts.map((part, i) =>
        links.includes(part) ? (
          <a key={i} href={part}>
            {part}
          </a>
        ) : (
          <span key={i}>{part}</span>
        ),
      )}
    </p>
  );
}

function cut(text: string, link: string): string[] {
  const at = text.indexOf(link);
  if (at < 0 || link === '') return [text];
  return [text.slice(0, at), link, ...cut(text.slice(at + link.length), link)].filter((piece) => piece !== '');
}
