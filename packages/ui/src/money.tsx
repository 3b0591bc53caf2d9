import { formatMoney, type Pence } from "@withy/core/money";
import { classNames } from "./class-names";

/** An amount in whole pence as £1,234.50 with figures that stand in columns. Table cells around it need `n`. */
export function Money({
  pence,
  currency = "GBP",
  strong = false,
}: {
  pence: Pence;
  currency?: string;
  strong?: boolean;
}) {
  return (
    <span className={classNames("num nowrap", strong && "font-semibold")}>
      {formatMoney(pence, currency)}
    </span>
  );
}
