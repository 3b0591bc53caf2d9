"use client";
import { DataTable, type TableSort } from "@withy/ui/data-table";
import { Line, NowLine } from "@withy/ui/line";
import { Money } from "@withy/ui/money";
import { Edge, type EdgeName, StateMark } from "@withy/ui/state-mark";
import { Tabs } from "@withy/ui/tabs";
import { useState } from "react";
import { Section } from "./section";

const invoices = [
  { number: "SG-03755", payer: "Samphire Mutual", total: 94800, owed: 94800 },
  { number: "SG-04171", payer: "G. Lamptey", total: 19800, owed: 18600 },
  { number: "SG-04187", payer: "T. Marsh, excess", total: 2400, owed: 2400 },
];
type Invoice = (typeof invoices)[number];

const lines: { at: string; edge: EdgeName; label: string; name: string }[] = [
  { at: "10:15", edge: "solid", label: "In session", name: "Eleri Tamworth" },
  { at: "10:30", edge: "thick", label: "Arrived", name: "Hugo Blythe" },
  { at: "10:45", edge: "double", label: "Confirmed", name: "Miriam Stroud" },
  { at: "11:35", edge: "thin", label: "Booked", name: "Amy Thistle" },
];

const columns = [
  {
    id: "number",
    header: "Invoice",
    cell: (row: Invoice) => row.number,
    rowHeader: true,
    sortable: true,
    total: "3 invoices",
  },
  { id: "payer", header: "Payer", cell: (row: Invoice) => row.payer },
  {
    id: "total",
    header: "Total",
    numeric: true,
    cell: (row: Invoice) => <Money pence={row.total} />,
    total: <Money pence={117000} />,
  },
  {
    id: "owed",
    header: "Owed",
    numeric: true,
    cell: (row: Invoice) => <Money pence={row.owed} />,
    total: <Money pence={115800} />,
  },
];

function InvoiceTable({ name }: { name: string }) {
  const [sort, setSort] = useState<TableSort>({ id: "number", descending: false });
  const [page, setPage] = useState(0);
  const rows = sort.descending ? [...invoices].reverse() : invoices;
  return (
    <DataTable
      caption={name}
      columns={columns}
      rows={rows}
      rowId={(row) => row.number}
      sort={sort}
      onSortChange={setSort}
      page={{ index: page, size: 3, total: 9 }}
      onPageChange={setPage}
      chosenId="SG-04171"
    />
  );
}

/** Lists on lines, tables, tabs. */
export function Records({ prefix }: { prefix: string }) {
  return (
    <>
      <section className="guide-lines" aria-label={`Lines, ${prefix}`}>
        {lines.map((line, i) => (
          <div key={line.at}>
            {i === 2 && <NowLine time="10:42" />}
            <Line gutter={line.at} tick chosen={i === 2} className="guide-line">
              <Edge edge={line.edge} />
              <StateMark code={line.edge} label={line.label} edge={line.edge} bare />
              <b>{line.name}</b>
            </Line>
          </div>
        ))}
      </section>
      <Section title="Table and tabs" note="Totals: one line above, two below">
        <div className="guide-two">
          <InvoiceTable name={`Invoices, ${prefix}`} />
          <Tabs
            label={`Record, ${prefix}`}
            items={[
              {
                value: "timeline",
                label: "Timeline",
                panel: <p className="pt-2">Everything once, in time order.</p>,
              },
              { value: "notes", label: "Notes", count: 5, panel: <p className="pt-2">Five notes.</p> },
              { value: "money", label: "Money", panel: <p className="pt-2">What is owed.</p> },
            ]}
          />
        </div>
      </Section>
    </>
  );
}
