import type { OfferLinkView } from "@withy/contracts/diary";
import { isAppError } from "@withy/core/errors";
import { getOfferLink } from "@withy/services/diary";
import { Button } from "@withy/ui/button";
import type { Metadata } from "next";
import type { ReactNode } from "react";
import { PlainPage } from "@/components/plain-page";
import { systemContext } from "@/server/session";
import "./offer.css";

// The address is the secret: it must not be told to any other site.
export const metadata: Metadata = { title: "A time for you", referrer: "same-origin" };
export const dynamic = "force-dynamic";

async function findOffer(token: string): Promise<OfferLinkView | null> {
  try {
    return await getOfferLink(systemContext(), token);
  } catch (error) {
    if (isAppError(error) && error.code === "not-found") return null;
    throw error;
  }
}

/**
 * What a patient's private link opens: the time on offer and two buttons. Opening it changes nothing, so a mail scanner
 * that follows links takes no time from anyone; the buttons are a plain form that works without any script.
 */
export default async function OfferPage({ params }: PageProps<"/link/[token]/offer">) {
  const { token } = await params;
  const offer = await findOffer(token);
  if (!offer)
    return (
      <PlainPage title="This link does not work">
        <p>It was not copied whole, or it is not one of ours. Ring the practice that wrote to you.</p>
      </PlainPage>
    );
  if (offer.standing === "open") return <OpenOffer offer={offer} token={token} />;
  const { title, text } = endings[offer.standing](offer);
  return (
    <PlainPage title={title} lead={offer.practice}>
      <p>{text}</p>
      {offer.standing === "yours" && <Facts offer={offer} />}
      <p className="soft">Ring us on {offer.phone} if you have a question.</p>
    </PlainPage>
  );
}

function Facts({ offer }: { offer: OfferLinkView }) {
  const rows: [string, ReactNode][] = [
    ["When", `${offer.dayWords}, ${offer.startWords} to ${offer.endWords}`],
    ["Where", offer.place],
    ["With", offer.therapistName],
  ];
  return (
    <dl className="facts offerfacts">
      {rows.map(([label, value]) => (
        <div key={label}>
          <dt>{label}</dt>
          <dd>{value}</dd>
        </div>
      ))}
    </dl>
  );
}

function OpenOffer({ offer, token }: { offer: OfferLinkView; token: string }) {
  return (
    <PlainPage title={`${offer.dayWords} at ${offer.startWords}`} lead={`A time at ${offer.practice}`}>
      <p>Dear {offer.greetingName}, this time has come free. The first to accept has it.</p>
      <Facts offer={offer} />
      {offer.insteadOfWords && (
        <p>If you accept, we give up your appointment on {offer.insteadOfWords} for you.</p>
      )}
      <form method="post" action={`/link/${token}/offer/answer`} className="offeranswer">
        <Button kind="primary" size="wide" type="submit" name="answer" value="accept">
          Accept this time
        </Button>
        <Button size="wide" type="submit" name="answer" value="decline">
          No thanks
        </Button>
      </form>
      <p className="soft">
        Please answer by {offer.expiresWords}. If you say no, you stay on our list. Ring us on {offer.phone}{" "}
        if you have a question.
      </p>
    </PlainPage>
  );
}

type Ending = (offer: OfferLinkView) => { title: string; text: string };

const endings: Record<Exclude<OfferLinkView["standing"], "open">, Ending> = {
  yours: () => ({
    title: "The time is yours",
    text: "It is booked. We have sent you an e-mail with a file for your calendar.",
  }),
  declined: () => ({
    title: "Thank you for telling us",
    text: "You said no to this time. You stay on our list, and we will write when another comes free.",
  }),
  gone: ({ dayWords, startWords }) => ({
    title: "This time has gone",
    text: `We are sorry: the time on ${dayWords} at ${startWords} has been taken. You stay on our list, in the same place, and your other appointments are as they were.`,
  }),
  expired: ({ expiresWords }) => ({
    title: "The time to answer is over",
    text: `This offer was open until ${expiresWords}. You stay on our list, and we will write when another time comes free.`,
  }),
  stopped: ({ dayWords, startWords }) => ({
    title: "This time is no longer on offer",
    text: `We are sorry: we can no longer give the time on ${dayWords} at ${startWords}. You stay on our list, and your other appointments are as they were.`,
  }),
  settled: () => ({
    title: "You are not waiting any more",
    text: "You have another time, or asked to be taken off our list, so there is nothing to answer here.",
  }),
  busy: () => ({
    title: "You have another appointment then",
    text: "You have an appointment with us at that time already, so we cannot book this one as well.",
  }),
};
