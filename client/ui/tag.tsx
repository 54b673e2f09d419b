import type { ReactNode } from 'react';

export type TagKind = 'plain' | 'result' | 'doubt' | 'refusal';

const looks: Readonly<Record<TagKind, string>> = {
  plain: 'tag', result: 'tag tag-result', doubt: 'tag tag-doubt', refusal: 'tag tag-refusal',
};

/** A word in a thin frame: "extrapolated", "computed", a state. */
export function Tag({ kind = 'plain', children }: { kind?: TagKind; children: ReactNode }) {
  return <span className={looks[kind]}>{children}</span>;
}
