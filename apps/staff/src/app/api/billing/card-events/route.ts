import { newId } from "@withy/core/ids";
import { receiveCardEvent } from "@withy/services/billing";
import { problemResponse } from "@/server/run-route";
import { systemContext } from "@/server/session";

const largestEvent = 200_000;

/** The card company's events. No session and no origin: the signature over the raw body is the only proof. */
export async function POST(request: Request) {
  try {
    const body = await request.text();
    if (body.length > largestEvent) return new Response(null, { status: 413 });
    await receiveCardEvent(systemContext(), body, request.headers.get("stripe-signature") ?? "");
    return Response.json({ received: true });
  } catch (error) {
    return problemResponse(error, newId(), "POST", "/api/billing/card-events");
  }
}
