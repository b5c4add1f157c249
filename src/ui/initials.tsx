/** People as initials in ruled squares; the one who looks is underlined. */
export function Initials({
  people,
}: {
  readonly people: readonly { readonly name: string; readonly says?: string; readonly here?: boolean }[];
}) {
  return (
    <span className="who">
      {people.map((person, i) => (
        <b
          key={`${person.name}-${i}`}
          className={person.here ? 'here' : undefined}
          title={person.says === undefined ? person.name : `${person.name}, ${person.says}`}
        >
          <span aria-hidden="true">{initialsOf(person.name)}</span>
          <span className="visually-hidden">{person.name}</span>
        </b>
      ))}
    </span>
  );
}

export function initialsOf(name: string): string {
  const words = name.trim().split(/\s+/);
  const first = words[0]?.[0] ?? '?';
  const last = words.length > 1 ? (words.at(-1)?.[0] ?? '') : '';
  return (first + last).toUpperCase();
}
