import type { InvoiceListView } from "@withy/contracts/billing";
import { Button } from "@withy/ui/button";

/** Steps through the pages of a list; gone where there is one page only. */
export function ListPager({ list, onPage }: { list: InvoiceListView; onPage: (page: number) => void }) {
  const last = Math.max(1, Math.ceil(list.total / list.pageSize));
  if (last === 1) return null;
  return (
    <nav className="body accpager" aria-label="Pages of this list">
      <Button size="small" disabled={list.page <= 1} onClick={() => onPage(list.page - 1)}>
        Page before
      </Button>
      <span className="small soft num">
        Page {list.page} of {last}
      </span>
      <Button size="small" disabled={list.page >= last} onClick={() => onPage(list.page + 1)}>
        Next page
      </Button>
    </nav>
  );
}
