import { plainDateWords } from "@withy/core/date-words";
import { isAppError } from "@withy/core/errors";
import { getLetterLink } from "@withy/services/letters";
import type { Metadata } from "next";
import { PlainPage } from "@/components/plain-page";
import { systemContext } from "@/server/session";
import { LetterReaderForm } from "./letter-reader-form";

// The address is the secret: it must not be told to any other site.
export const metadata: Metadata = { title: "A letter for you", referrer: "same-origin" };

async function findLink(token: string) {
  try {
    return await getLetterLink(systemContext(), token);
  } catch (error) {
    if (isAppError(error) && error.code === "not-found") return null;
    throw error;
  }
}

/**
 * What a doctor's private link opens: who wrote, and the question for the patient's date of birth. Nothing of the
 * letter comes before the answer, so a mail scanner that follows links neither reads it nor counts as its reader.
 */
export default async function LetterLinkPage({ params }: PageProps<"/link/[token]/letter">) {
  const { token } = await params;
  const link = await findLink(token);
  if (!link) {
    return (
      <PlainPage title="This link does not work">
        <p>
          It may have run out, or it was not copied whole. Ring the practice that sent it and give the
          reference in the e-mail.
        </p>
      </PlainPage>
    );
  }
  return (
    <PlainPage title={`A letter from ${link.practice}`} lead={`Reference ${link.reference}`}>
      <LetterReaderForm token={token} />
      <p>
        It opens as a PDF. This page works until {plainDateWords(link.expiresOn)}; please file the letter
        before then. If you cannot tell whom it is about, ring us and give the reference.
      </p>
      <p className="soft">
        {link.contactLines.map((line) => (
          <span key={line}>
            {line}
            <br />
          </span>
        ))}
      </p>
    </PlainPage>
  );
}
