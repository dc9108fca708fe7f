import { getEditionPdf } from '#shared/contracts/editions.ts';
import { addressOf } from '#src/lib/api/address-of.ts';
import type { ProblemAddress } from '#src/lib/problem/problem-address.ts';

/** The kept PDF, saved under its own name. */
export function PdfLink({ address, n }: { readonly address: ProblemAddress; readonly n: number }) {
  return (
    <a
      href={addressOf(getEditionPdf.path, { ...address, n })}
      download
      aria-label={`Print or save PDF of edition ${n}`}
      className="inline-flex min-h-9 items-center rounded-md border-[1.25px] border-edge bg-paper px-3.5 text-sm font-[550]"
    >
      Print or save PDF
    </a>
  );
}
