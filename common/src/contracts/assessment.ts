export const verdictKinds = ['protected', 'bare', 'not-determined', 'outside', 'under-strength'] as const;
/**
 * protected: needs the stated thickness · bare: may stay bare · not-determined: something is missing ·
 * outside: the product's assessment does not reach · under-strength: fails before any fire
 */
export type VerdictKind = (typeof verdictKinds)[number];
