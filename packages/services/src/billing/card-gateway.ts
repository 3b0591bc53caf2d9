import { type CardGateway, CardGatewayError } from "@withy/billing/card/card-gateway";
import { stripeCardGateway } from "@withy/billing/card/stripe-card-gateway";
import { AppError, refused } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { z } from "zod";

const settings = z.object({
  WITHY_CARD_KEY: z.string().min(1),
  WITHY_CARD_WEBHOOK_SECRET: z.string().min(1),
  WITHY_CARD_HOST: z.string().min(1).optional(),
  WITHY_CARD_PORT: z.coerce.number().int().optional(),
});

let current: CardGateway | undefined;

/** The card provider of this installation, as its settings name it; a stand-in's where a host is given. */
export function cardGateway(): CardGateway {
  if (current) return current;
  const env = settings.parse(process.env);
  current = stripeCardGateway({
    secretKey: env.WITHY_CARD_KEY,
    webhookSecret: env.WITHY_CARD_WEBHOOK_SECRET,
    ...(env.WITHY_CARD_HOST === undefined
      ? {}
      : { endpoint: { protocol: "http", host: env.WITHY_CARD_HOST, port: env.WITHY_CARD_PORT ?? 80 } }),
  });
  return current;
}

/** Puts another provider in place; undefined goes back to the settings. */
export function setCardGateway(gateway: CardGateway | undefined): void {
  current = gateway;
}

/** What a person is told where the provider said no, or said nothing. */
export function cardProblem(error: unknown): unknown {
  if (!(error instanceof CardGatewayError)) return error;
  if (error.isRefused) {
    return refused(
      refusal(
        "card-refused",
        "The card company did not accept this. Check the amount, or take the money another way.",
      ),
    );
  }
  return new AppError(
    "unavailable",
    "The card company does not answer. Try again in a minute, or take the money another way.",
    {
      kind: "card-silent",
    },
  );
}
