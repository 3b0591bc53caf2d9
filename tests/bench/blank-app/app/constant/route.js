export const dynamic = "force-dynamic";

export function GET() {
  return Response.json({ constant: true });
}
