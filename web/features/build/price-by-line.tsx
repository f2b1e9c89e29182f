import { money } from "#web/lib/format.ts";
import { useBuildDesk } from "./build-desk.tsx";

/** Every line of the block's price, folded away until it is wanted. */
export function PriceByLine({ open = false }: { open?: boolean }) {
  const { price } = useBuildDesk().evaluation;
  return (
    <details open={open} className="border-y border-rule">
      <summary className="flex min-h-target cursor-pointer items-center justify-between gap-4 font-condensed text-xl font-semibold">
        Price by line
        {price !== null && <span className="text-lg numerals">{money(price.totalCents)}</span>}
      </summary>
      {price === null ? (
        <p className="pb-3 text-iron">The price begins with the family.</p>
      ) : (
        <table className="mb-3 w-full border-collapse">
          <caption className="sr-only">Price of one block by line</caption>
          <thead className="sr-only">
            <tr>
              <th scope="col">Line</th>
              <th scope="col">Amount</th>
            </tr>
          </thead>
          <tbody>
            {price.lines.map((line) => (
              <tr key={line.label} className="border-t border-rule">
                <th scope="row" className="py-1.5 pr-4 text-left align-top font-normal">
                  {line.label}
                </th>
                <td className="py-1.5 text-right align-top whitespace-nowrap numerals">
                  {money(line.amountCents)}
                </td>
              </tr>
            ))}
          </tbody>
          <tfoot>
            <tr className="border-t-2 border-ink">
              <th scope="row" className="py-1.5 pr-4 text-left font-semibold">
                One block, without freight and tax
              </th>
              <td className="py-1.5 text-right text-lg numerals">{money(price.totalCents)}</td>
            </tr>
          </tfoot>
        </table>
      )}
    </details>
  );
}
