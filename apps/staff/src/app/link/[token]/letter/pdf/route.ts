import { isAppError } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { openLinkedLetter } from "@withy/services/letters";
import { checkOrigin, problemResponse } from "@/server/run-route";
import { systemContext } from "@/server/session";

/** The letter behind a private link, for who knows the date of birth. A POST, because its reading is written down. */
export async function POST(request: Request, { params }: { params: Promise<{ token: string }> }) {
  const requestId = newId();
  const { token } = await params;
  try {
    checkOrigin(request);
    const form = await request.formData().catch(() => null);
    const bornOn = String(form?.get("bornOn") ?? "");
    const { bytes, filename } = await openLinkedLetter(systemContext(requestId), { token, bornOn });
    return new Response(new Uint8Array(bytes), {
      headers: {
        "content-type": "application/pdf",
        "content-disposition": `inline; filename="${filename}"`,
        "cache-control": "private, no-store",
        "referrer-policy": "no-referrer",
      },
    });
  } catch (error) {
    // Without the right date, or when the link has run out, its page says what to do.
    if (isAppError(error) && error.code !== "forbidden")
      return new Response(null, {
        status: 303,
        headers: { location: `/link/${encodeURIComponent(token)}/letter` },
      });
    return problemResponse(error, requestId, "POST", "/link/letter/pdf");
  }
}
