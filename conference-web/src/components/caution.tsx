import type { ReactNode } from 'react';

/** Stands where the risk is: plan, computed scores, theatre sheet, decision. */
export function Caution({ children }: { children?: ReactNode }) {
  return (
    <p
      role="note"
      style={{ margin: '12px 0', padding: '8px 12px', borderLeft: '3px solid var(--amber-9)', background: 'var(--amber-2)', color: 'var(--ink)', lineHeight: 1.45, maxWidth: 'var(--measure)' }}
    >
      {children ??
        'Decision support. It does not replace the judgement of the treating team, the implant maker’s instructions or local policy.'}
    </p>
  );
}
