/** Invented chains and stores; the towns and ZIP codes are real, so that positions and zones are. */
export const organisation = {
  name: 'Lantern Line Kitchen Mechanical',
  timeZone: 'America/Chicago',
};

export const chains = ['Peck & Ember', 'Tidewater Basket', 'Curly Quarter'] as const;

export const regions = ['Upper Ohio', 'Prairie', 'Saguaro'] as const;

export interface DemoStore {
  readonly region: (typeof regions)[number];
  readonly name: string;
  readonly city: string;
  readonly state: string;
  readonly postalCode: string;
}

const store =
  (region: DemoStore['region']) =>
  (name: string, city: string, state: string, postalCode: string): DemoStore => ({
    region,
    name,
    city,
    state,
    postalCode,
  });

const ohio = store('Upper Ohio');
const prairie = store('Prairie');
const saguaro = store('Saguaro');

export const stores: readonly DemoStore[] = [
  ohio('Cedar Falls Rd', 'Columbus', 'OH', '43215'),
  ohio('Harbor & 9th', 'Toledo', 'OH', '43604'),
  ohio('Mill Pond', 'Cleveland', 'OH', '44113'),
  ohio('Union Depot', 'Akron', 'OH', '44308'),
  ohio('Old Quarry', 'Cincinnati', 'OH', '45202'),
  ohio('Fairgrounds', 'Dayton', 'OH', '45402'),
  ohio('Stone Bridge', 'Covington', 'KY', '41011'),
  ohio('Paddock Row', 'Lexington', 'KY', '40507'),
  ohio('Monument Cir', 'Springfield', 'OH', '45502'),
  ohio('College St', 'Athens', 'OH', '45701'),
  ohio('Ferry Landing', 'Zanesville', 'OH', '43701'),
  ohio('Market Sq', 'Canton', 'OH', '44702'),
  ohio('Furnace Hill', 'Youngstown', 'OH', '44503'),
  ohio('Reservoir Pk', 'Lima', 'OH', '45801'),
  ohio('Canal Lock 4', 'Newark', 'OH', '43055'),
  prairie('Lakeshore E', 'Chicago', 'IL', '60601'),
  prairie('Rock River', 'Rockford', 'IL', '61101'),
  prairie('Grandview', 'Peoria', 'IL', '61602'),
  prairie('Capitol Ave', 'Springfield', 'IL', '62701'),
  prairie('Grain Row', 'Cedar Rapids', 'IA', '52401'),
  prairie('Court Ave', 'Des Moines', 'IA', '50309'),
  prairie('River Bend', 'Davenport', 'IA', '52801'),
  prairie('Third Ward', 'Milwaukee', 'WI', '53202'),
  prairie('Isthmus', 'Madison', 'WI', '53703'),
  prairie('Bay Beach', 'Green Bay', 'WI', '54301'),
  prairie('Mill District', 'Minneapolis', 'MN', '55401'),
  prairie('Cathedral Hill', 'Saint Paul', 'MN', '55102'),
  prairie('Silver Lake', 'Rochester', 'MN', '55901'),
  prairie('Old Market', 'Omaha', 'NE', '68102'),
  prairie('Haymarket', 'Lincoln', 'NE', '68508'),
  saguaro('Central Stn', 'Phoenix', 'AZ', '85004'),
  saguaro('Mill Ave', 'Tempe', 'AZ', '85281'),
  saguaro('Falcon Fld', 'Mesa', 'AZ', '85201'),
  saguaro('Ocotillo', 'Chandler', 'AZ', '85225'),
  saguaro('Canal Walk', 'Scottsdale', 'AZ', '85251'),
  saguaro('Glen Arena', 'Glendale', 'AZ', '85301'),
  saguaro('Barrio', 'Tucson', 'AZ', '85701'),
  saguaro('Colorado X-ing', 'Yuma', 'AZ', '85364'),
  saguaro('Ponderosa', 'Flagstaff', 'AZ', '86001'),
  saguaro('Granite Dells', 'Prescott', 'AZ', '86301'),
  saguaro('Lost Dutchman', 'Apache Junction', 'AZ', '85120'),
  saguaro('Estrella', 'Goodyear', 'AZ', '85338'),
  saguaro('Airport N', 'Peoria', 'AZ', '85345'),
  saguaro('Cotton Gin', 'Casa Grande', 'AZ', '85122'),
  saguaro('Fort Gate', 'Sierra Vista', 'AZ', '85635'),
];
