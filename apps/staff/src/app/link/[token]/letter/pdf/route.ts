import { newId } from "@withy/core/ids";
import { openLinkedLetter } from "@withy/services/letters";
import { checkOrigin, problemResponse } from "@/server/run-route";
import { systemContext } from "@/server/session";

/** The letter behind a private link. A POST, because its reading is written down. */
export async function POST(request: Request, { params }: { params: Promise<{ token: string }> }) {
  const requestId = newId();
  try {
    checkOrigin(request);
    const { token } = await params;
    const { bytes, filename } = await openLinkedLetter(systemContext(requestId), token);
    return new Response(new Uint8Array(bytes), {
      headers: {
        "content-type": "application/pdf",
        "content-disposition": `inline; filename="${filename}"`,
        "cache-control": "private, no-store",
        "referrer-policy": "no-referrer",
      },
    });
  } catch (error) {
    return problemResponse(error, requestId, "POST", "/link/letter/pdf");
  }
}
