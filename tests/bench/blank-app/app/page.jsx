import { connection } from "next/server";

/** The least that the framework can serve: what our own pages weigh beyond this is ours. */
export default async function Page() {
  await connection();
  return <main>Blank</main>;
}
