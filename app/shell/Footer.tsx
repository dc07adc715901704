import styles from './Footer.module.css';
import { PURPOSE } from './Purpose';

/** What the program owes its users to say, where every recipe can be seen. */
export function Footer() {
  return (
    <footer className={styles.footer}>
      <p>{PURPOSE}</p>
      <p>
        Calculated properties are estimates: no batch is released and no claim made on a calculation; the laboratory
        confirms each batch. A recipe is not an approval: engine, gear, food-contact and other controlled uses follow
        their own standards and licences.
      </p>
      <p>
        Compatibility of additives, seals and water, air release, oxidation life and toxicity are not computed. Heat and
        pump by the site's procedures and the safety data sheets: temperature ceiling of each package, flash point of
        the lightest stock, static charge, water in a hot kettle.
      </p>
      <p>“Proven” speaks of the arithmetic under these figures and this blending rule.</p>
    </footer>
  );
}
