import { redirectDocument, type LoaderFunctionArgs } from 'react-router-dom';
import { getEditionPdf } from '#shared/contracts/editions.ts';
import { addressOf } from '#src/lib/api/address-of.ts';

/** The pages of an edition are its kept PDF: the browser shows it as it stands. */
export function loader({ params }: LoaderFunctionArgs): Response {
  const { team = '', problem: number = '', n = '' } = params;
  return redirectDocument(`${addressOf(getEditionPdf.path, { team, number, n })}?show`);
}
