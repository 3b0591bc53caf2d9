import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { ForgetCopies } from "@/components/forget-copies";
import { PlainPage } from "@/components/plain-page";
import { currentSession } from "@/server/context";
import { SignInForm } from "./sign-in-form";

export const metadata: Metadata = { title: "Sign in" };

export default async function SignInPage({ searchParams }: PageProps<"/sign-in">) {
  if (await currentSession()) redirect("/");
  const query = await searchParams;
  const from = typeof query["from"] === "string" ? query["from"] : "";
  return (
    <PlainPage title="Sign in" lead={leadWords(query)}>
      {query["left"] === "1" && <ForgetCopies />}
      <SignInForm from={from} />
      <p>
        <a href="/forgot">I forgot my password</a>
      </p>
    </PlainPage>
  );
}

function leadWords(query: Record<string, string | string[] | undefined>): string | undefined {
  if (query["left"] === "1") return "You have signed out. Close the browser if others use this computer.";
  if (query["ready"] !== undefined) return "Your password is set. Sign in with it.";
  return undefined;
}
