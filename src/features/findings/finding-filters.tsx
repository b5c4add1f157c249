import type { ReactNode } from 'react';

import type { Finding, Severity as SeverityName } from '#shared/model/analysis.ts';
import { basisOf, sheetOf, zoneAmbientC } from '#shared/model/defaults.ts';
import type { Design } from '#shared/model/design.ts';
import { formatC } from '#shared/units/temperature.ts';
import { Check } from '#src/ui/check.tsx';
import { FindField } from '#src/ui/find-field.tsx';
import { Severity } from '#src/ui/severity.tsx';

import { groupOfRule, placeOfFinding } from './finding-places.ts';

/** What is hidden; nothing at first. A key is `zone:engine`, `rule:conductor`. */
export interface Hidden {
  readonly keys: ReadonlySet<string>;
  readonly text: string;
}
export const NOTHING_HIDDEN: Hidden = { keys: new Set(), text: '' };

/** The keys a finding is filed under. It is hidden when one whole kind of its keys is hidden. */
export function keysOf(design: Design, finding: Finding): readonly (readonly string[])[] {
  const place = placeOfFinding(design, finding);
  return [
    [`state:${finding.accepted === true ? 'accepted' : 'open'}`],
    [`severity:${finding.severity}`],
    place.zoneIds.length === 0 ? ['zone:'] : place.zoneIds.map((id) => `zone:${id}`),
    [`sheet:${place.sheetId ?? ''}`],
    [`rule:${groupOfRule(finding.rule)}`],
  ];
}

export function isShown(design: Design, finding: Finding, hidden: Hidden): boolean {
  const words = hidden.text.toLowerCase().split(/\s+/).filter(Boolean);
  const text =
    `${finding.message} ${finding.rule} ${finding.source.title} ${placeOfFinding(design, finding).mark}`.toLowerCase();
  return (
    words.every((word) => text.includes(word)) &&
    keysOf(design, finding).every((keys) => keys.some((key) => !hidden.keys.has(key)))
  );
}

export function FindingFilters({
  design,
  findings,
  hidden,
  onChange,
}: {
  readonly design: Design;
  readonly findings: readonly Finding[];
  readonly hidden: Hidden;
  readonly onChange: (hidden: Hidden) => void;
}) {
  const counts = new Map<string, number>();
  for (const finding of findings) {
    for (const key of keysOf(design, finding).flat()) counts.set(key, (counts.get(key) ?? 0) + 1);
  }
  const basis = basisOf(design);
  const groups: readonly { title: string; lines: readonly { key: string; title: ReactNode }[] }[] = [
    {
      title: 'State',
      lines: [
        { key: 'state:open', title: 'Open' },
        { key: 'state:accepted', title: 'Accepted with a reason' },
      ],
    },
    {
      title: 'Severity',
      lines: (['must', 'should', 'note'] satisfies SeverityName[]).map((severity) => ({
        key: `severity:${severity}`,
        title: <Severity of={severity} />,
      })),
    },
    {
      title: 'Zone',
      lines: [
        ...Object.values(design.zones).map((zone) => ({
          key: `zone:${zone.id}`,
          title: zone.engineSpace ? `${zone.name}, ${formatC(zoneAmbientC(zone, basis))}` : zone.name,
        })),
        { key: 'zone:', title: 'in no zone' },
      ],
    },
    {
      title: 'Sheet',
      lines: Object.values(design.sheets)
        .map(sheetOf)
        .sort((a, b) => a.number - b.number)
        .map((sheet) => ({ key: `sheet:${sheet.id}`, title: `${sheet.number} ${sheet.title}` })),
    },
    {
      title: 'Rule',
      lines: [...new Set(findings.map((finding) => groupOfRule(finding.rule)))]
        .sort()
        .map((group) => ({ key: `rule:${group}`, title: group })),
    },
  ];

  return (
    <>
      <FindField label="Find in findings" value={hidden.text} onChange={(text) => onChange({ ...hidden, text })} />
      {groups
        .filter((group) => group.lines.length > 0)
        .map((group) => (
          <section className="filter" key={group.title} aria-label={group.title}>
            <h3>{group.title}</h3>
            <ul>
              {group.lines.map(({ key, title }) => {
                const count = counts.get(key) ?? 0;
                return (
                  <li key={key} className={count === 0 ? 'off' : undefined}>
                    <Check
                      checked={!hidden.keys.has(key)}
                      onChange={(isOn) => {
                        const keys = new Set(hidden.keys);
                        if (isOn) keys.delete(key);
                        else keys.add(key);
                        onChange({ ...hidden, keys });
                      }}
                    >
                      {title}
                    </Check>
                    <em>{count}</em>
                  </li>
                );
              })}
            </ul>
          </section>
        ))}
    </>
  );
}
