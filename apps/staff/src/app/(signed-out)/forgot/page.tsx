import type { Metadata } from "next";
import { PlainPage } from "@/components/plain-page";
import { ForgotForm } from "./forgot-form";

export const metadata: Metadata = { title: "New password" };

export default async function ForgotPage({ searchParams }: PageProps<"/forgot">) {
  const isSent = (await searchParams)["sent"] === "1";
  if (isSent)
    return (
      <PlainPage title="Look in your mail">
        <p>
          If that address signs in here, a link for a new password is on its way. It works once, for one hour.
        </p>
        <p className="soft">
          Nothing after five minutes? Look among unwanted mail, then ask the practice owner which address you
          sign in with.
        </p>
        <p>
          <a href="/sign-in">Back to sign in</a>
        </p>
      </PlainPage>
    );
  return (
    <PlainPage title="Choose a new password" lead="Type the address you sign in with. We send a link to it.">
      <ForgotForm />
      <p className="small">
        <a href="/sign-in">Back to sign in</a>
      </p>
    </PlainPage>
  );
}
