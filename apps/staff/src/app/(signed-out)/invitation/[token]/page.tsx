import { openAccountLink } from "@withy/services/practices";
import type { Metadata } from "next";
import { PlainPage } from "@/components/plain-page";
import { systemContext } from "@/server/session";
import { PasswordForm } from "../../password-form";

export const metadata: Metadata = { title: "Welcome", referrer: "no-referrer" };

export default async function InvitationPage({ params }: PageProps<"/invitation/[token]">) {
  const { token } = await params;
  const link = await openAccountLink(systemContext(), { token, purpose: "invitation" });
  if (!link)
    return (
      <PlainPage title="This invitation no longer works">
        <p>
          An invitation works once, for seven days. Ask the practice owner to send another, or sign in if you
          have set a password already.
        </p>
        <p>
          <a href="/sign-in">Sign in</a>
        </p>
      </PlainPage>
    );
  return (
    <PlainPage
      title={`Welcome, ${link.name}`}
      lead={`Choose a password for ${link.practiceName}. You sign in with ${link.email}.`}
    >
      <PasswordForm token={token} purpose="invitation" email={link.email} />
    </PlainPage>
  );
}
