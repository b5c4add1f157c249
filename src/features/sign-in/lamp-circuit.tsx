/** A battery, a fuse, a switch and a lamp: the smallest whole drawing there is. */
export function LampCircuit({ closed }: { readonly closed: boolean }) {
  return (
    <svg className="gate-drawing" viewBox="0 0 960 632" aria-hidden="true">
      <rect x="22" y="22" width="916" height="588" fill="none" stroke="var(--ink-1)" strokeWidth="1.6" />
      <path d="M480 12V30M480 602V620M12 316H30M930 316H948" stroke="var(--ink-1)" strokeWidth="1.6" />
      <g transform="translate(72 0)" className="gate-circuit">
        {RUNS.map(({ d, colour }) => (
          <g key={d} fill="none" strokeLinejoin="round">
            <path d={d} stroke="var(--wire-outline)" strokeWidth="6.5" />
            <path d={d} stroke={colour} strokeWidth="5" />
          </g>
        ))}
        <g fill="none" stroke="var(--ink-1)" strokeWidth="2.25" strokeLinecap="round">
          <path d="M120 290H184V310H120ZM104 300H200" />
          <path d={closed ? 'M280 300H304M352 300H376M352 300L304 300' : 'M280 300H304M352 300H376M352 300L310 276'} />
          <path d="M28 388V404M28 420V436M8 404H48M18 420H38M40 392h10M45 387v10" />
          <circle cx="452" cy="400" r="26" style={closed ? { fill: 'var(--c-yellow)' } : undefined} />
          <path d="M452 364V374M452 426V436M433.6 381.6L470.4 418.4M470.4 381.6L433.6 418.4" />
        </g>
        {TERMINALS.map(([x, y]) => (
          <circle
            key={`${x} ${y}`}
            cx={x}
            cy={y}
            r="3.5"
            fill="var(--sheet)"
            stroke="var(--ink-1)"
            strokeWidth="1.75"
          />
        ))}
        <g className="gate-marks">
          <text x="64" y="408">
            G1
          </text>
          <text x="120" y="278">
            F1
          </text>
          <text x="280" y="266">
            Q1
          </text>
          <text x="398" y="404" textAnchor="end">
            E1
          </text>
        </g>
        <g className="gate-words">
          <text x="64" y="426">
            12 V
          </text>
          <text x="146" y="278">
            10 A
          </text>
          <text x="306" y="266">
            {closed ? 'closed' : 'open: sign in to close it'}
          </text>
          <text x="398" y="422" textAnchor="end">
            chart lamp
          </text>
        </g>
        <g className="gate-labels">
          <text x="16" y="348" textAnchor="end">
            W1
          </text>
          <text x="464" y="340">
            W3
          </text>
          <text x="240" y="324" textAnchor="middle">
            W2 · 14 · red
          </text>
          <text x="240" y="530" textAnchor="middle">
            W4 · 14 · yellow
          </text>
        </g>
      </g>
    </svg>
  );
}

const RUNS = [
  { d: 'M28 388V300H104', colour: 'var(--dc-pos)' },
  { d: 'M200 300H280', colour: 'var(--dc-pos)' },
  { d: 'M376 300H452V364', colour: 'var(--dc-pos)' },
  { d: 'M452 436V508H28V436', colour: 'var(--dc-neg)' },
] as const;

const TERMINALS = [
  [28, 388],
  [28, 436],
  [104, 300],
  [200, 300],
  [280, 300],
  [376, 300],
  [452, 364],
  [452, 436],
] as const;
