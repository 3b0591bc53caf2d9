import { offerAnswers } from "@withy/contracts/diary";
import { isAppError } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { answerOffer } from "@withy/services/diary";
import { checkOrigin, problemResponse } from "@/server/run-route";
import { systemContext } from "@/server/session";

/**
 * The answer to an offer behind a private link, from a plain form. Whatever came of it, its page says: it shows the
 * offer as it stands, so a repeat of the form shows the first answer again.
 */
export async function POST(request: Request, { params }: { params: Promise<{ token: string }> }) {
  const requestId = newId();
  const { token } = await params;
  try {
    checkOrigin(request);
    const form = await request.formData().catch(() => null);
    const answer = offerAnswers.find((one) => one === form?.get("answer"));
    if (answer) await answerOffer(systemContext(requestId), token, answer);
  } catch (error) {
    const isTold = isAppError(error) && error.code !== "forbidden" && error.kind !== "too-many-tries";
    if (!isTold) return problemResponse(error, requestId, "POST", "/link/offer/answer");
  }
  return new Response(null, {
    status: 303,
    headers: { location: `/link/${encodeURIComponent(token)}/offer`, "cache-control": "private, no-store" },
  });
}
