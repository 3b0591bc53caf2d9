import { startFakes } from "@withy/fakes/start-fakes";
import { type OutgoingMail, openMail } from "@withy/gateways/mail";
import { afterAll, beforeAll, describe, expect, it } from "vitest";

let fakes: Awaited<ReturnType<typeof startFakes>>;
let gateway: ReturnType<typeof openMail>;

beforeAll(async () => {
  fakes = await startFakes({ httpPort: 0, smtpPort: 0, dataDir: null });
  gateway = openMail({ host: "127.0.0.1", port: fakes.smtpPort, encryption: "none" });
});
afterAll(async () => {
  gateway.close();
  await fakes.close();
});

const mail: OutgoingMail = {
  id: "01890000-0000-7000-8000-0000000000aa",
  from: { name: "Marram Physiotherapy, Łódź “desk”", address: "post@withy.example" },
  replyTo: "hello@marram.example",
  to: "eleri@post.example",
  subject: "Żółć: your appointment £62",
  text: "Dear Łucja,\nsee you at 5:30pm.\n",
  html: "<p>Dear Łucja</p>",
  attachments: [
    { filename: "facture é.pdf", contentType: "application/pdf", content: Buffer.from([0x25, 0x50, 0, 255]) },
  ],
  calendar: {
    method: "REQUEST",
    filename: "appointment.ics",
    content: "BEGIN:VCALENDAR\r\nMETHOD:REQUEST\r\nEND:VCALENDAR\r\n",
  },
};
const read = async (path: string) => (await fetch(`http://127.0.0.1:${fakes.httpPort}${path}`)).text();

describe("a mail through the gateway into the mailbox", () => {
  it("arrives whole, with the Message-ID of its row", async () => {
    expect(await gateway.send(mail)).toEqual({ outcome: "sent", messageId: `<${mail.id}@withy.example>` });
    const [caught] = JSON.parse(await read("/mailbox.json?to=ELERI@post.example"));
    expect(caught).toMatchObject({
      messageId: `<${mail.id}@withy.example>`,
      subject: mail.subject,
      to: [mail.to],
      replyTo: mail.replyTo,
    });
    expect(caught.text).toContain("Dear Łucja");
    expect(caught.from).toContain("Łódź");
    const files = caught.attachments.map(
      (file: { filename: string; contentType: string }) => `${file.filename} ${file.contentType}`,
    );
    expect(files).toEqual(
      expect.arrayContaining(["facture é.pdf application/pdf", "appointment.ics application/ics"]),
    );
    const pdf = caught.attachments.find(
      (file: { contentType: string }) => file.contentType === "application/pdf",
    );
    const bytes = await (await fetch(`http://127.0.0.1:${fakes.httpPort}${pdf.path}`)).arrayBuffer();
    expect([...new Uint8Array(bytes)]).toEqual([0x25, 0x50, 0, 255]);
    expect(fakes.store.list(mail.to)[0]?.raw).toMatch(
      /content-type: text\/calendar; charset=utf-8; method=REQUEST/i,
    );
  });

  it("is shown on the page, escaped, and its HTML may run nothing", async () => {
    await gateway.send({
      ...mail,
      id: "01890000-0000-7000-8000-0000000000ab",
      to: "x@post.example",
      subject: "<b>hello</b>",
      html: "<script>1</script>",
    });
    expect(await read("/mailbox?to=x@post.example")).toContain("&lt;b&gt;hello&lt;/b&gt;");
    const [caught] = JSON.parse(await read("/mailbox.json?to=x@post.example"));
    const shown = await fetch(`http://127.0.0.1:${fakes.httpPort}/mailbox/${caught.id}/html`);
    expect(shown.headers.get("content-security-policy")).toMatch(/default-src 'none'.*sandbox/);
    expect(await shown.text()).toContain('<base target="_top">');
  });

  it.each([
    ["refused@post.example", { outcome: "refused", reason: "smtp-550" }],
    ["later@post.example", { outcome: "try-later", reason: "smtp-451" }],
  ])("to %s answers what the server said", async (to, result) => {
    expect(await gateway.send({ ...mail, to })).toEqual(result);
    expect(fakes.store.list(to)).toEqual([]);
  });

  it("cannot be given a second recipient or a header by its texts", async () => {
    const to = "inject@post.example";
    await gateway.send({
      ...mail,
      id: "01890000-0000-7000-8000-0000000000ac",
      to,
      subject: "Hi\r\nBcc: spy@post.example",
      replyTo: "a@b.example\r\nX-Spy: 1",
    });
    const caught = fakes.store.list(to)[0];
    expect(caught?.envelopeTo).toEqual([to]);
    expect(caught?.parsed.headers.has("x-spy")).toBe(false);
    expect(caught?.parsed.headers.has("bcc")).toBe(false);
  });

  it("is worth another try where no server answers", async () => {
    const nobody = openMail({ host: "127.0.0.1", port: 1, encryption: "none" });
    expect((await nobody.send(mail)).outcome).toBe("try-later");
    nobody.close();
  });

  it("is not sent in the clear to a server that offers no encryption where encryption is asked for", async () => {
    const strict = openMail({ host: "127.0.0.1", port: fakes.smtpPort, encryption: "starttls" });
    expect((await strict.send({ ...mail, to: "clear@post.example" })).outcome).toBe("try-later");
    expect(fakes.store.list("clear@post.example")).toEqual([]);
    strict.close();
  });
});
