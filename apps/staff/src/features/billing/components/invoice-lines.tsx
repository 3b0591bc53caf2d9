import { vatWords } from "@withy/billing/vat";
import type { InvoiceLineView, InvoiceView } from "@withy/contracts/billing";
import { shortDate } from "@withy/core/date-words";
import { formatMoney, type Pence } from "@withy/core/money";

const figure = (pence: Pence): string => formatMoney(pence).replace("£", "");

function described(line: InvoiceLineView): string {
  const count = line.quantity === 1 ? "" : `, ${line.quantity} at ${formatMoney(line.unitPence)}`;
  const off = line.discountBasisPoints === 0 ? "" : `, less ${line.discountBasisPoints / 100}%`;
  return `${line.description}${count}${off}`;
}

/** What is charged, line by line. Without a VAT registration there are no VAT columns. */
export function InvoiceLines({ invoice }: { invoice: InvoiceView }) {
  const withVat = invoice.isVatShown;
  return (
    <table className="acc lines">
      <caption className="vh">What is charged</caption>
      <thead>
        <tr>
          <th scope="col">Date</th>
          <th scope="col">For</th>
          {withVat && (
            <>
              <th scope="col">VAT rate</th>
              <th scope="col" className="n">
                Net
              </th>
              <th scope="col" className="n">
                VAT
              </th>
            </>
          )}
          <th scope="col" className="n">
            £
          </th>
        </tr>
      </thead>
      <tbody>
        {invoice.lines.map((line) => (
          <tr key={line.id}>
            <td className="num">{line.on === null ? "" : shortDate(line.on, invoice.today)}</td>
            <td>{described(line)}</td>
            {withVat && (
              <>
                <td data-label="VAT rate">{vatWords[line.vatTreatment]}</td>
                <td className="n" data-label="Net">
                  {figure(line.netPence)}
                </td>
                <td className={line.vatPence === 0 ? "n soft" : "n"} data-label="VAT">
                  {figure(line.vatPence)}
                </td>
              </>
            )}
            <td className="n" data-label="£">
              {figure(line.totalPence)}
            </td>
          </tr>
        ))}
      </tbody>
      <tfoot>
        <tr>
          <th scope="row" colSpan={withVat ? 3 : 2}>
            <span className="vh">Sum</span>
          </th>
          {withVat && (
            <>
              <td className="n" data-label="Net">
                {figure(invoice.netPence)}
              </td>
              <td className="n" data-label="VAT">
                {figure(invoice.vatPence)}
              </td>
            </>
          )}
          <td className="n" data-label="£">
            {figure(invoice.totalPence)}
          </td>
        </tr>
      </tfoot>
    </table>
  );
}
