import { openAccountLink } from "@withy/services/practices";
import type { Metadata } from "next";
import { PlainPage } from "@/components/plain-page";
import { systemContext } from "@/server/session";
import { PasswordForm } from "../../password-form";

export const metadata: Metadata = { title: "New password", referrer: "no-referrer" };

export default async function ResetPage({ params }: PageProps<"/reset/[token]">) {
  const { token } = await params;
  const link = await openAccountLink(systemContext(), { token, purpose: "reset" });
  if (!link)
    return (
      <PlainPage title="This link no longer works">
        <p>A link for a new password works once, for one hour. Nothing was changed.</p>
        <p>
          <a href="/forgot">Send a new link</a>
        </p>
      </PlainPage>
    );
  return (
    <PlainPage
      title="Choose a new password"
      lead={`For ${link.email} at ${link.practiceName}. Every browser that is signed in will be signed out.`}
    >
      <PasswordForm token={token} purpose="reset" email={link.email} />
    </PlainPage>
  );
}
