import { Fragment, useState, type ReactNode } from 'react';

import type { PartsLine } from '#shared/model/analysis.ts';
import type { Design } from '#shared/model/design.ts';
import type { UnitSystem } from '#shared/units/length.ts';

import { CableSwatch } from './cable-swatch.tsx';
import { isCable, marksOf, sayCableSum, sayQuantity, type PartsGroup } from './parts-groups.ts';

/** The list by groups; a group folds, a line opens its particulars. */
export function PartsTable({
  groups,
  design,
  units,
  chosenId,
  onChoose,
  particulars,
}: {
  readonly groups: readonly PartsGroup[];
  readonly design: Design;
  readonly units: UnitSystem;
  readonly chosenId: string | undefined;
  readonly onChoose: (line: PartsLine) => void;
  /** Below the chosen line, where there is no room beside the list. */
  readonly particulars: ReactNode;
}) {
  const [shut, setShut] = useState<ReadonlySet<string>>(new Set());
  function fold(title: string) {
    const next = new Set(shut);
    if (!next.delete(title)) next.add(title);
    setShut(next);
  }

  return (
    <table className="parts-table">
      <thead>
        <tr>
          <th scope="col">For</th>
          <th scope="col">Part</th>
          <th scope="col">Rating</th>
          <th scope="col" className="r">
            Qty
          </th>
          <th scope="col">Unit</th>
        </tr>
      </thead>
      {groups.map((group) => (
        <tbody key={group.title}>
          <tr className="group">
            <th colSpan={5} scope="rowgroup">
              <button type="button" aria-expanded={!shut.has(group.title)} onClick={() => fold(group.title)}>
                {group.title}
                <em>
                  {group.lines.length} {group.lines.length === 1 ? 'line' : 'lines'}
                </em>
              </button>
            </th>
          </tr>
          {!shut.has(group.title) &&
            group.lines.map((line) => {
              const { quantity, unit } = sayQuantity(line, units);
              const marks = marksOf(design, line);
              const isChosen = line.id === chosenId;
              return (
                <Fragment key={line.id}>
                  <tr className={isChosen ? 'line on' : 'line'} onClick={() => onChoose(line)}>
                    <td className="mono marks">{shorten(marks)}</td>
                    <td className="part">
                      {isCable(line) && <CableSwatch design={design} line={line} />}
                      <button
                        type="button"
                        aria-pressed={isChosen}
                        onClick={(event) => {
                          event.stopPropagation();
                          onChoose(line);
                        }}
                      >
                        {line.part}
                      </button>
                      {isCable(line) && <small>{sayCableSum(design, line, units)}</small>}
                    </td>
                    <td>{line.rating}</td>
                    <td className="r">{quantity}</td>
                    <td>{unit}</td>
                  </tr>
                  {isChosen && particulars !== null && (
                    <tr className="inline">
                      <td colSpan={5}>{particulars}</td>
                    </tr>
                  )}
                </Fragment>
              );
            })}
        </tbody>
      ))}
    </table>
  );
}

function shorten(marks: readonly string[]): string {
  return marks.length <= 3 ? marks.join(' ') : `${marks.slice(0, 2).join(' ')} +${marks.length - 2}`;
}
