import { findingId, type Finding, type Remedy, type Severity, type Subject } from '#shared/model/analysis.ts';
import type { Basis, EntityId } from '#shared/model/design.ts';
import type { Proof } from '#shared/solve/proof.ts';
import { formatA } from '#shared/units/current.ts';
import { formatPercent, formatPercentBeside } from '#shared/units/fraction.ts';
import { formatLength } from '#shared/units/length.ts';
import { formatC } from '#shared/units/temperature.ts';
import { formatV } from '#shared/units/voltage.ts';

type Profile = NonNullable<Basis['profile']>;

export interface RuleSource {
  readonly title: string;
  readonly clause: string;
}

/** One thing the check looks for. Its file name is its id, its doc comment its page. */
export interface Rule {
  readonly id: string;
  readonly title: string;
  readonly severity: Severity;
  readonly sources: Readonly<Record<Profile, RuleSource>>;
  /** With `{figure}` for each figure, printed with its unit. */
  readonly message: string;
  check(proof: Proof): Iterable<Spoken>;
}

/** What a rule says of one subject; what it leaves out is as the rule has it. */
export interface Spoken {
  readonly subject: Subject;
  readonly figures: Readonly<Record<string, number | string>>;
  readonly severity?: Severity;
  readonly message?: string;
  readonly source?: RuleSource;
  readonly mode?: EntityId;
  readonly remedies?: readonly Remedy[];
}

export function defineRule(rule: Rule): Rule {
  return rule;
}

/** All that a rule finds, at most one finding a subject: the first it says. */
export function applyRule(rule: Rule, proof: Proof): Finding[] {
  const found = new Map<string, Finding>();
  for (const spoken of rule.check(proof)) {
    const id = findingId(rule.id, spoken.subject);
    if (found.has(id)) continue;
    found.set(id, {
      id,
      rule: rule.id,
      severity: spoken.severity ?? rule.severity,
      subject: spoken.subject,
      ...(spoken.mode !== undefined && { mode: spoken.mode }),
      message: fillIn(spoken.message ?? rule.message, spoken.figures, proof),
      figures: spoken.figures,
      source: spoken.source ?? rule.sources[proof.basis.profile],
      remedies: spoken.remedies ?? [],
    });
  }
  return [...found.values()];
}

/** The unit of a figure stands at the end of its name: `ratedA`, `stubM`, `lostV`, `share`. */
function fillIn(message: string, figures: Spoken['figures'], { basis }: Proof): string {
  const inMessage = [...message.matchAll(/\{(\w+)\}/g)].map(([, name]) => name!);
  return message.replace(/\{(\w+)\}/g, (_, name: string) => {
    const figure = figures[name];
    if (typeof figure !== 'number') return figure ?? '';
    const beside = inMessage.flatMap((other) => {
      const value = figures[other];
      return typeof value === 'number' && other.at(-1) === name.at(-1) ? [value] : [];
    });
    if (name.endsWith('A')) return toldApart(figure, beside, formatA);
    if (name.endsWith('M')) return toldApart(figure, beside, (m, finer) => formatLength(m, basis.units, finer));
    if (name.endsWith('V')) return formatV(figure);
    if (name.endsWith('C')) return formatC(figure);
    if (name.endsWith('Count')) return String(figure);
    const { limit } = figures;
    return typeof limit === 'number' ? formatPercentBeside(figure, limit) : formatPercent(figure);
  });
}

const MOST_MORE_DECIMALS = 6;

/** With as many more decimals as it takes for no other figure of the message to read the same and be another. */
function toldApart(figure: number, others: readonly number[], format: (figure: number, finer: number) => string) {
  const apart = others.filter((other) => Math.abs(other - figure) > 1e-9 * Math.abs(figure));
  for (let finer = 0; finer < MOST_MORE_DECIMALS; finer++) {
    const text = format(figure, finer);
    if (apart.every((other) => format(other, finer) !== text)) return text;
  }
  return format(figure, 0);
}
