import type { FieldKey } from './field-keys.ts';

/** Names, written in rows of words with commas between them. */
function names(...rows: readonly string[]): readonly string[] {
  return rows.flatMap((row) => row.split(', '));
}

/**
 * Headings under which plants write each field, normalised as `normalHeading` does it: small letters, no
 * accents, no signs, without unit and symbol. English, German, Dutch, French, Spanish.
 */
export const FIELD_NAMES: Readonly<Record<FieldKey, readonly string[]>> = {
  tag: names(
    'tag, point tag, equipment tag, tag number, point, lub point, lubrication point, lubricator tag',
    'point number, kennzeichen, kks, bmk, schmierstelle, schmierpunkt, messstelle, schmierstellennummer',
    'tagnummer, smeerpunt, smeerpuntnummer, kenmerk, codering, repere, repere point, point de graissage',
    'numero de point, etiqueta, punto de engrase, punto de lubricacion, numero de punto',
  ),
  description: names(
    'description, text, point description, designation text, service, benennung, beschreibung, bezeichnung',
    'klartext, omschrijving, beschrijving, benaming, libelle, descriptif, denomination, descripcion',
    'denominacion',
  ),
  function: names(
    'function, area, function designation, functional designation, plant unit, unit, system, funktion',
    'bereich, anlage, anlagenteil, funktionskennzeichen, functie, gebied, installatie, functieaanduiding',
    'fonction, zone, secteur, installation, funcion, area de planta, instalacion',
  ),
  location: names(
    'location, place, location designation, position, ort, einbauort, ortskennzeichen, standort, locatie',
    'plaats, plaatsaanduiding, emplacement, lieu, localisation, ubicacion, lugar, localizacion',
  ),
  product: names(
    'product, product designation, component, device designation, produkt, betriebsmittel',
    'produktkennzeichen, komponente, productaanduiding, component aanduiding, produit, composant, materiel',
    'producto, componente',
  ),
  machine: names(
    'machine, equipment, machine name, asset, maschine, aggregat, ausrustung, uitrusting, machinenaam',
    'equipement, nom de machine, maquina, equipo',
  ),
  boreMm: names(
    'bore, bore diameter, shaft diameter, inside diameter, inner diameter, bearing bore, bohrung',
    'bohrungsdurchmesser, innendurchmesser, wellendurchmesser, boring, asdiameter, binnendiameter, asgat',
    'alesage, diametre interieur, diametre arbre, diametro interior, agujero, diametro del eje',
  ),
  outsideMm: names(
    'outside dia, outside diameter, outer diameter, outer dia, od, aussendurchmesser, aussen',
    'buitendiameter, diametre exterieur, diametro exterior',
  ),
  widthMm: names('width, bearing width, breite, lagerbreite, breedte, lagerbreedte, largeur, ancho, anchura'),
  speedRpm: names(
    'speed, shaft speed, rotational speed, speed of rotation, revolutions, rpm, drehzahl, nenndrehzahl',
    'toerental, vitesse, vitesse de rotation, velocidad, velocidad de giro',
  ),
  hoursPerDay: names(
    'hours per day, hours a day, running hours, running hours per day, operating hours per day, hours day',
    'hours, stunden je tag, stunden pro tag, betriebsstunden je tag, betriebsstunden pro tag, std tag',
    'uren per dag, draaiuren per dag, bedrijfsuren per dag, heures par jour, heures de marche par jour',
    'horas por dia, horas al dia',
  ),
  daysPerWeek: names(
    'days per week, days a week, running days per week, tage je woche, tage pro woche',
    'betriebstage je woche, dagen per week, jours par semaine, dias por semana',
  ),
  demandCm3Per100h: names(
    'demand, grease demand, grease need, stated demand, consumption, grease quantity, bedarf, fettbedarf',
    'schmierstoffbedarf, fettmenge, behoefte, vetbehoefte, vetverbruik, besoin, besoin en graisse',
    'consommation, demanda, necesidad, necesidad de grasa, consumo',
  ),
  demandCm3Per1000h: names(
    'demand, grease demand, grease need, stated demand, consumption, grease quantity, bedarf, fettbedarf',
    'schmierstoffbedarf, fettmenge, behoefte, vetbehoefte, vetverbruik, besoin, besoin en graisse',
    'consommation, demanda, necesidad, necesidad de grasa, consumo',
  ),
  grease: names(
    'grease, grease type, lubricant, fett, fettsorte, schmierstoff, vet, vetsoort, smeermiddel, graisse',
    'lubrifiant, grasa, lubricante',
  ),
  dispenserType: names(
    'dispenser type, dispenser, type, device type, lubricator type, lubricator, type of dispenser',
    'spendertyp, spender, typ, geratetyp, schmierstoffgebertyp, schmierstoffgeber, dispensertype',
    'smeertoestel, type smeertoestel, type de distributeur, distributeur, type de graisseur, graisseur',
    'tipo de dosificador, dosificador, tipo de lubricador, lubricador, tipo',
  ),
  cartridgeCm3: names(
    'cartridge, cartridge size, cartridge volume, cartr, kartusche, kartuschengrosse, kartuschenvolumen',
    'patroon, patroongrootte, patrooninhoud, cartouche, volume cartouche, cartucho, volumen cartucho',
  ),
  doseCm3: names(
    'dose, dose per pulse, dosing volume, stroke volume, dosis, dosis je impuls, dosiermenge, hubvolumen',
    'dosering, dosis per puls, dose par impulsion, dosis por pulso',
  ),
  wiring: names(
    'wiring, wiring scheme, connection, cores, number of cores, anschluss, anschlussart, verdrahtung, adern',
    'aderzahl, aansluiting, bedrading, aders, aantal aders, raccordement, cablage, conducteurs, cableado',
    'conexion, hilos',
  ),
  controller: names(
    'controller, plc, plc name, control system, steuerung, sps, besturing, automate, api, automata',
    'controlador, automata programable',
  ),
  outputModule: names(
    'output module, module, card, output card, do module, do card, baugruppe, ausgangsbaugruppe',
    'ausgangskarte, modul, karte, uitgangskaart, kaart, uitgangsmodule, module de sortie, carte',
    'carte de sortie, modulo, modulo de salida, tarjeta, tarjeta de salida',
  ),
  outputChannel: names(
    'output channel, channel, do channel, kanal, ausgangskanal, kanaal, uitgangskanaal, voie',
    'voie de sortie, canal, canal de salida',
  ),
  outputAddress: names(
    'output address, output, do address, control address, ausgangsadresse, ausgang, adresse ausgang',
    'uitgangsadres, uitgang, adresse de sortie, sortie, direccion de salida, salida',
  ),
  statusModule: names(
    'status module, input module, input card, status card, di module, di card, eingangsbaugruppe',
    'eingangskarte, ingangskaart, ingangsmodule, module d entree, carte d entree, modulo de entrada',
    'tarjeta de entrada',
  ),
  statusChannel: names(
    'status channel, input channel, di channel, eingangskanal, ingangskanaal, voie d entree',
    'canal de entrada',
  ),
  statusAddress: names(
    'status address, input address, status, input, di address, status input, eingangsadresse, eingang',
    'statusadresse, ingangsadres, ingang, statusadres, adresse d entree, entree, direccion de entrada',
    'entrada',
  ),
  signalType: names(
    'signal type, type of signal, io type, i o type, io, i o, signal direction, signal kind, kind of signal',
    'signaltyp, typ des signals, signalart, art des signals, ea typ, e a typ, e a, signaaltype, signaalsoort',
    'soort signaal, type de signal, genre de signal, e s, tipo de senal, clase de senal',
  ),
  module: names(
    'signal module, module, card, io module, io card, signal card, baugruppe, modul, karte, signalbaugruppe',
    'kaart, carte, modulo, tarjeta',
  ),
  channel: names('signal channel, channel, io channel, kanal, signalkanal, kanaal, voie, canal'),
  address: names(
    'signal address, address, io address, direct address, plc address, adresse, signaladresse, sps adresse',
    'adres, signaaladres, plc adres, adresse automate, direccion',
  ),
  junctionBox: names(
    'junction box, box, klemmenkasten, verteilerkasten, klemkast, aansluitkast, coffret, boite de jonction',
    'caja, caja de conexiones',
  ),
  cableTag: names(
    'cable, cable tag, cable number, cable designation, cable name, kabel, kabelnummer, kabelbezeichnung',
    'kabelkennzeichen, kabelcode, kabelnaam, numero de cable, repere cable, numero de cable electrico',
    'etiqueta de cable',
  ),
  cableLengthM: names(
    'cable length, length, cable, length of cable, lange, kabellange, leitungslange, kabel, lengte',
    'kabellengte, longueur, longueur de cable, longitud, longitud de cable, largo',
  ),
  crossSectionMm2: names(
    'cross section, conductor cross section, core cross section, cable, querschnitt, leiterquerschnitt',
    'aderquerschnitt, kabel, doorsnede, aderdoorsnede, section, section de conducteur, seccion',
    'seccion de conductor',
  ),
  circuit: names(
    'circuit, supply circuit, feeder, stromkreis, versorgungskreis, stroomkring, voedingsgroep',
    'circuit d alimentation, circuito, circuito de alimentacion',
  ),
  remarks: names(
    'remarks, remark, comment, comments, note, notes, bemerkung, bemerkungen, anmerkung, hinweis, opmerking',
    'opmerkingen, notitie, remarque, remarques, commentaire, observaciones, observacion, comentario, nota',
    'notas',
  ),
};
