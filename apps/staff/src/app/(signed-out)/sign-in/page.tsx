import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { PlainPage } from "@/components/plain-page";
import { currentSession } from "@/server/context";
import { SignInForm } from "./sign-in-form";

export const metadata: Metadata = { title: "Sign in" };

export default async function SignInPage({ searchParams }: PageProps<"/sign-in">) {
  if (await currentSession()) redirect("/");
  const query = await searchParams;
  const from = typeof query["from"] === "string" ? query["from"] : "";
  return (
    <PlainPage
      title="Sign in"
      lead={
        query["left"] === "1"
          ? "You have signed out. Close the browser if others use this computer."
          : undefined
      }
    >
      <SignInForm from={from} />
      <p>
        <a href="/forgot">I forgot my password</a>
      </p>
    </PlainPage>
  );
}
