import { canonicalJson } from './canonical-json.ts';
import type { FrozenEdition } from './frozen-edition.ts';

/** The parts of an edition that its seal vouches for. */
export type SealedParts = Pick<FrozenEdition, 'evidence' | 'document' | 'findings'> & {
  readonly files: readonly { readonly sha: string }[];
};

/** Figures of the fingerprint that are drawn and printed: 48 bits. */
const SHOWN_FIGURES = 12;

/**
 * The seal of an edition: the SHA-256 of the canonical JSON of its evidence, document, findings and the fingerprints
 * of its files. Whoever has the content can compute it again.
 *
 * @param parts - as they are kept
 * @param sha256 - gives the SHA-256 of a text's UTF-8 bytes in 64 hexadecimal figures
 */
export function sealOf(parts: SealedParts, sha256: (text: string) => string): string {
  const { evidence, document, findings, files } = parts;
  const hashes = files.map(({ sha }) => sha).sort();
  return sha256(canonicalJson({ evidence, document, findings, files: hashes }));
}

/**
 * The figures that stand beside a seal on paper.
 *
 * @param seal - hexadecimal figures
 * @example sealFigures('b7e241c09d3a77') // => 'b7e2 41c0 9d3a'
 */
export function sealFigures(seal: string): string {
  return (seal.slice(0, SHOWN_FIGURES).match(/.{4}/g) ?? []).join(' ');
}
