// Common given names (common knowledge, no source), without those that are as often a word, a place,
// a month or an eponym of the trade.
const NAMES = `
Aaron Adam Adrian Agnes Ahmed Aisha Alan Albert Alejandro Alexander Alfred Alice Alison Amanda Amelia Amir Amy Ana Andrea
Andreas Andrew Angela Angus Anita Ann Anna Anne Annette Annie Anthony Antonio Arthur Astrid Audrey Barbara Beatrice
Benjamin Bernard Bernd Beryl Beth Betty Beverley Birgit Brenda Brian Bridget Bruno Carlos Carol Caroline Catherine
Cecilia Charles Chloe Christian Christina Christine Christopher Claire Clara Colin Craig Cynthia Daniel Daphne Darren
David Dawn Deborah Deirdre Denise Dennis Derek Diana Diane Diego Dieter Dimitri Donald Doreen Doris Dorothy Douglas
Duncan Edith Edna Edward Eileen Elaine Eleanor Elena Elisabeth Elizabeth Ella Ellen Elsie Emily Emma Enid Eric Erika
Ernest Esther Ethel Eva Evelyn Fatima Felicity Fernando Fiona Frances Francesca Francis Franz Fred Frederick Friedrich
Gareth Gary Geoffrey George Georgina Gerald Gerhard Gertrud Gertrude Gillian Giovanni Giulia Gladys Glenn Gloria Gordon
Graham Greta Guillaume Gustav Hannah Hans Harold Harriet Harry Hassan Heather Heinrich Heinz Helen Helena Helga Henri
Henry Herbert Hermann Hilda Hilary Horst Howard Hugh Ian Ibrahim Ida Imran Ingrid Irene Iris Isabel Isabella Ivan Ivor
Jack Jacqueline James Jane Janet Janice Jasmine Jason Javier Jean Jeffrey Jennifer Jeremy Jessica Jill Joan Joanna
Joanne Johann Johannes John Jonathan Jorge Joseph Josephine Joshua Joyce Juan Judith Julia Julian Julie Jürgen Karen
Karin Karl Katherine Kathleen Kathryn Keith Kelly Kenneth Kevin Khalid Klaus Kurt Laura Lauren Laurence Leonard Leslie
Lilian Linda Lisa Lorraine Louis Louise Lucy Luigi Luis Lydia Magdalena Malcolm Manfred Marcus Margaret Maria Marian
Marianne Marie Marilyn Marion Marjorie Martha Martin Mary Matthew Maureen Mavis Mehmet Melanie Melissa Michael Michelle
Miguel Mildred Mohamed Mohammed Moira Monica Monika Morag Muhammad Muriel Nancy Naomi Natalie Neil Nicholas Nicola Nigel
Nora Norma Norman Olga Olive Oliver Olivia Oscar Pamela Patricia Patrick Paul Paula Pauline Pedro Peggy Penelope Peter
Petra Philip Philippa Phyllis Pierre Priya Rachel Rajesh Ralph Ramesh Raymond Rebecca Regina Renate Richard Rita Robert
Roberto Robin Roderick Roger Ronald Rosemary Roy Ruth Sally Samantha Samuel Sandra Sanjay Sarah Sean Sergei Sharon Sheila
Shirley Sibylle Silvia Simon Sofia Sophia Sophie Stefan Stephanie Stephen Steven Stuart Susan Susanne Sven Sylvia Tamara
Teresa Terence Thelma Theodore Theresa Timothy Tobias Trevor Ursula Valerie Vanessa Vera Veronica Victor Vincent
Violet Vivian Walter Wanda Wendy Werner Wilhelm William Winifred Wolfgang Yasmin Yvonne Zoe
`;

const GIVEN_NAMES = new Set(NAMES.trim().toLowerCase().split(/\s+/));

/** Whether a word is a common given name, in any case. */
export const isGivenName = (word: string): boolean => GIVEN_NAMES.has(word.toLowerCase());
