import { getLetterPdf } from "@withy/services/letters";
import { route } from "@/server/run-route";

export const GET = route(getLetterPdf, {
  respond: ({ bytes, filename }) =>
    new Response(new Uint8Array(bytes), {
      headers: {
        "content-type": "application/pdf",
        "content-disposition": `inline; filename="${filename}"`,
        "cache-control": "private, no-store",
      },
    }),
});
