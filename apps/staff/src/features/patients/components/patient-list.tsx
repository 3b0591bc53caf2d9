"use client";
import type { PatientPage, PatientRow } from "@withy/contracts/patients";
import { plainDateWords } from "@withy/core/date-words";
import { ButtonLink } from "@withy/ui/button";
import { type DataColumn, DataTable } from "@withy/ui/data-table";
import { EmptyState } from "@withy/ui/empty-state";
import { Skeleton } from "@withy/ui/skeleton";
import { TextInput } from "@withy/ui/text-input";
import Link from "next/link";
import { useDeferredValue, useEffect, useState } from "react";
import { usePatientList } from "../hooks/use-patient-list";

const columns: readonly DataColumn<PatientRow>[] = [
  {
    id: "name",
    header: "Name",
    rowHeader: true,
    cell: (row) => (
      <>
        <Link href={`/patients/${row.id}`}>{row.name}</Link>
        {row.preferredName && <span className="soft">, likes {row.preferredName}</span>}
      </>
    ),
  },
  { id: "born", header: "Born", cell: (row) => <span className="num">{plainDateWords(row.bornOn)}</span> },
  { id: "phone", header: "Phone", cell: (row) => <span className="num">{row.phone ?? "none"}</span> },
  { id: "postcode", header: "Postcode", cell: (row) => row.postcode ?? "" },
];

interface Props {
  search: string;
  /** The page of that search, as the server painted it. */
  first: PatientPage;
  mayRegister: boolean;
}

/** The whole register, narrowed as one types; the address keeps search and page. */
export function PatientList({ search: startSearch, first, mayRegister }: Props) {
  const [typed, setTyped] = useState(startSearch);
  const [page, setPage] = useState(first.page);
  const search = useDeferredValue(typed.trim());
  const { data, error } = usePatientList(search, page, { search: startSearch, first });
  useEffect(() => {
    const query = new URLSearchParams();
    if (search !== "") query.set("search", search);
    if (page > 1) query.set("page", String(page));
    const text = query.toString();
    window.history.replaceState(null, "", text === "" ? "/patients" : `/patients?${text}`);
  }, [search, page]);
  return (
    <>
      <TextInput
        id="patient-search"
        label="Find a patient"
        hint="Name in any order, date of birth, phone, NHS number or invoice number"
        type="search"
        value={typed}
        onChange={(event) => {
          setTyped(event.target.value);
          setPage(1);
        }}
      />
      {error && <p className="danger">{error.message}</p>}
      {!data && !error && <Skeleton lines={8} label="Patients are being found" />}
      {data && (
        <>
          <p className="small soft" role="status">
            {countWords(data.total, data.isCutShort, search)}
          </p>
          <DataTable
            caption="Patients"
            columns={columns}
            rows={data.rows}
            rowId={(row) => row.id}
            page={{ index: data.page - 1, size: data.pageSize, total: data.total }}
            onPageChange={(index) => setPage(index + 1)}
            empty={<NobodyFound search={search} mayRegister={mayRegister} />}
          />
        </>
      )}
    </>
  );
}

function countWords(total: number, isCutShort: boolean, search: string): string {
  if (total === 0) return "";
  if (isCutShort)
    return `The first ${total.toLocaleString("en-GB")}. Type more of the name to narrow them down.`;
  const people = total === 1 ? "1 patient" : `${total.toLocaleString("en-GB")} patients`;
  return search === "" ? `${people}, by family name` : `${people} found`;
}

function NobodyFound({ search, mayRegister }: { search: string; mayRegister: boolean }) {
  const name = /\d/.test(search) ? "" : `?name=${encodeURIComponent(search)}`;
  return (
    <EmptyState
      title={search === "" ? "No one is registered yet." : `No one matches “${search}”.`}
      action={
        mayRegister && (
          <ButtonLink kind="primary" href={`/patients/new${search === "" ? "" : name}`} as={Link}>
            Register a patient
          </ButtonLink>
        )
      }
    >
      {search !== "" && "Try fewer letters, the date of birth, or the last digits of the phone."}
    </EmptyState>
  );
}
