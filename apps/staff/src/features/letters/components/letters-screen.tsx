"use client";
import type { LetterRow } from "@withy/contracts/letters";
import type { Page as PageOf } from "@withy/contracts/page";
import { ButtonLink } from "@withy/ui/button";
import { ChoiceLinks } from "@withy/ui/choice";
import { EmptyState } from "@withy/ui/empty-state";
import { Page, PageBody, PageTitle } from "@withy/ui/page";
import Link from "next/link";
import { useLetters } from "../hooks/use-letters";
import { LetterLine } from "./letter-line";

type State = "all" | "draft" | "signed";
const choices: readonly { value: State; label: string }[] = [
  { value: "all", label: "All" },
  { value: "draft", label: "Drafts" },
  { value: "signed", label: "Signed" },
];

export function LettersScreen({
  state,
  first,
  zone,
}: {
  state: State;
  first: PageOf<LetterRow>;
  zone: string;
}) {
  const { rows, page, pageSize, total } = useLetters({ state, page: first.page }, first).data;
  const address = (wished: number) => `/letters?state=${state}&page=${wished}`;
  const items = choices.map(({ value, label }) => ({
    href: `/letters?state=${value}`,
    label,
    current: value === state,
  }));
  return (
    <Page>
      <PageTitle
        title="Letters"
        lead={`${total} ${total === 1 ? "letter" : "letters"}`}
        actions={<ChoiceLinks label="Which letters" items={items} as={Link} />}
      />
      {rows.length === 0 ? (
        <PageBody>
          <EmptyState title="No letters here">
            A discharge letter is written from a patient’s record, under Letters, and is found here from then
            on.
          </EmptyState>
        </PageBody>
      ) : (
        rows.map((letter) => <LetterLine key={letter.id} letter={letter} zone={zone} />)
      )}
      {total > pageSize && (
        <PageBody>
          <nav className="btns" aria-label="Pages of the list">
            {page > 1 && (
              <ButtonLink as={Link} href={address(page - 1)}>
                Newer
              </ButtonLink>
            )}
            {page * pageSize < total && (
              <ButtonLink as={Link} href={address(page + 1)}>
                Older
              </ButtonLink>
            )}
          </nav>
        </PageBody>
      )}
    </Page>
  );
}
