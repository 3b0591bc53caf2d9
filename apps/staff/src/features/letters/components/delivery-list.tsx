import type { LetterView } from "@withy/contracts/letters";
import { deliveryWords } from "../letter-words";

/** Who gets the letter, and for a sent one how far it has come. */
export function DeliveryList({ letter }: { letter: LetterView }) {
  const { recipient, deliveries, zone } = letter;
  if (deliveries.length === 0) {
    return (
      <ul className="letter-list">
        <li>
          <b>{recipient.name || "Nobody yet"}</b>
          <span className="small soft">
            {recipient.email ? `a private link to ${recipient.email}` : "no e-mail address: print and post"}
          </span>
        </li>
      </ul>
    );
  }
  return (
    <ul className="letter-list">
      {deliveries.map((delivery) => (
        <li key={delivery.id}>
          <b>{delivery.toName}</b>
          <span className="small soft">
            {delivery.toAddress}, {deliveryWords(delivery, zone)}
          </span>
          {delivery.problem && <span className="small danger">{delivery.problem}</span>}
        </li>
      ))}
    </ul>
  );
}
