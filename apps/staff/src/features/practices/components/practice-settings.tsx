import type { PracticeSettingsView, ServiceSettings, SiteSettings } from "@withy/contracts/practices";
import { formatMoney } from "@withy/core/money";
import { SectionHead } from "@withy/ui/section-head";
import { hoursWords } from "../hours-words";
import { workplaces } from "../workplaces";

/** How the practice is set up: sites and rooms, services and prices, working patterns. */
export function PracticeSettings({ settings }: { settings: PracticeSettingsView }) {
  return (
    <>
      <section aria-labelledby="sites-title">
        <SectionHead id="sites-title" title="Sites and rooms" />
        <table className="acc" data-stack="">
          <caption className="vh">Sites with their hours and rooms</caption>
          <thead>
            <tr>
              <th scope="col">Site</th>
              <th scope="col">Address</th>
              <th scope="col">Open</th>
              <th scope="col">Rooms</th>
            </tr>
          </thead>
          <tbody>
            {settings.sites.map((site) => (
              <SiteLine key={site.id} site={site} />
            ))}
          </tbody>
        </table>
      </section>
      <section aria-labelledby="services-title">
        <SectionHead id="services-title" title="Services and prices" aside="net prices that hold today" />
        <table className="acc" data-stack="">
          <caption className="vh">Services with their prices</caption>
          <thead>
            <tr>
              <th scope="col">Service</th>
              <th scope="col">Length</th>
              <th scope="col">Clean-down</th>
              <th scope="col">Prices</th>
            </tr>
          </thead>
          <tbody>
            {settings.services.map((service) => (
              <ServiceLine key={service.id} service={service} />
            ))}
          </tbody>
        </table>
      </section>
      <Patterns settings={settings} />
    </>
  );
}

function SiteLine({ site }: { site: SiteSettings }) {
  return (
    <tr>
      <th scope="row">{site.name}</th>
      <td data-label="Address">
        {[...site.addressLines, site.postcode, site.phone].filter(Boolean).join(", ")}
        {site.isStepFree && <span className="soft">. Step-free</span>}
      </td>
      <td data-label="Open">{hoursWords(site.hours) || "Closed"}</td>
      <td data-label="Rooms">{site.rooms.map((room) => room.name).join(", ") || "None"}</td>
    </tr>
  );
}

function ServiceLine({ service }: { service: ServiceSettings }) {
  return (
    <tr>
      <th scope="row">
        {service.name}
        {!service.isActive && <span className="soft">, no longer booked</span>}
      </th>
      <td data-label="Length">{service.durationMinutes} min</td>
      <td data-label="Clean-down">{service.cleanDownMinutes} min</td>
      <td data-label="Prices">
        {service.prices.length === 0 && <span className="warn">No price: visits cannot be invoiced</span>}
        {service.prices.map((price) => (
          <span key={price.id} className="priceline num">
            {formatMoney(price.amountPence)}{" "}
            <span className="soft">
              {[price.payerName ?? "whoever pays", price.siteName ?? "every site", price.vatTreatment].join(
                ", ",
              )}
            </span>
          </span>
        ))}
      </td>
    </tr>
  );
}

function Patterns({ settings }: { settings: PracticeSettingsView }) {
  return (
    <section aria-labelledby="patterns-title">
      <SectionHead id="patterns-title" title="Working patterns" />
      <table className="acc" data-stack="">
        <caption className="vh">Who works when and where</caption>
        <thead>
          <tr>
            <th scope="col">Therapist</th>
            <th scope="col">Site</th>
            <th scope="col">Hours</th>
            <th scope="col">Breaks</th>
          </tr>
        </thead>
        <tbody>
          {workplaces(settings.patterns).map((place) => (
            <tr key={place.id}>
              <th scope="row">{place.therapistName}</th>
              <td data-label="Site">{place.siteName}</td>
              <td data-label="Hours" className="num">
                {place.hours}
              </td>
              <td data-label="Breaks" className="num">
                {place.breaks || "None"}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}
