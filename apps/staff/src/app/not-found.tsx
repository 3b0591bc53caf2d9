import type { Metadata } from "next";
import { PlainPage } from "@/components/plain-page";

export const metadata: Metadata = { title: "Not found" };

export default function NotFound() {
  return (
    <PlainPage title="This page is not in the book">
      <p>The link may be old or mistyped, or it belongs to a part that your role does not open.</p>
      <p>
        <a href="/">Go to your day</a>
      </p>
    </PlainPage>
  );
}
